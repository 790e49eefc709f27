import type { Response } from 'express';
import type { AppDependencies } from '../dependencies.ts';
import type { DesignRun } from '../models/run.ts';
import { designCsv } from './designCsv.ts';
import { showsCurves } from './designFilms.ts';
import { designInputFile } from './designInputFile.ts';
import { openDesignResult, readDesignResult } from './designResult.ts';
import { plainFileName } from './fileNames.ts';
import { loadRunMaterials } from './runMaterials.ts';
import { sendPieces } from './sendPieces.ts';

/** What the answer to a design question is handed out as, to members and through links alike. */
export type DesignFile =
  | 'result'
  /** What is found so far while this machine answers the question, afterwards all of it or what was kept. */
  | 'partial'
  | 'csv'
  | 'input';

/** @throws Refusal 409 while there is no answer; nothing is sent then */
export async function sendDesignFile(
  { models, materials, pool, jobs }: Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'jobs'>,
  design: DesignRun,
  file: DesignFile,
  response: Response,
): Promise<void> {
  const fileName = plainFileName(design.name, 'design');
  switch (file) {
    case 'partial': {
      const soFar = design.state === 'done' ? null : jobs.partialDesign(design.id);
      if (soFar) {
        response.set('Cache-Control', 'no-store').json(soFar);
        return;
      }
      // It may have come to its end since the row was read.
      await design.reload({ attributes: ['state'] });
      return sendJson(await openDesignResult(models, design, 'unfinished'), response);
    }
    case 'result':
      return sendJson(await openDesignResult(models, design), response);
    case 'csv': {
      const result = await readDesignResult(models, design);
      response.attachment(`${fileName}.csv`).type('text/csv; charset=utf-8');
      return sendPieces(designCsv(design, result), response);
    }
    case 'input': {
      const result = await readDesignResult(models, design);
      const constants = await loadRunMaterials(materials, design);
      const question = design.input.design;
      const isShort = question.kind === 'cap' && !showsCurves(question);
      // Without the curves it must not pass for all that is shown.
      response
        .attachment(`${fileName}-input${isShort ? '-without-curves' : ''}.json`)
        .type('application/json');
      return sendPieces(designInputFile(pool, question, result, constants), response);
    }
  }
}

function sendJson(pieces: AsyncGenerator<Buffer>, response: Response): Promise<void> {
  response.set('Cache-Control', 'no-store').type('application/json');
  return sendPieces(pieces, response);
}
