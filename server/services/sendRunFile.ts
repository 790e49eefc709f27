import type { Response } from 'express';
import { resultByteLength } from '../../shared/resultFormat.ts';
import type { ReadingName } from '../../shared/run.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { SweepRun } from '../models/run.ts';
import { releaseMemory } from '../../worker/releaseMemory.ts';
import { partialResultBytes, resultBytes, resultCsv, resultHeaderOf } from './runDownloads.ts';
import { plainFileName } from './fileNames.ts';
import { runInputFile } from './runInputFile.ts';
import { loadRunMaterials } from './runMaterials.ts';
import { RunResult, chooseReadings } from './runResult.ts';
import { sendPieces } from './sendPieces.ts';

/**
 * The files that a run is handed out as, to members and through links alike. All are streamed: a run of a million
 * points takes no more memory than one of a thousand.
 */
export type RunFile =
  | { kind: 'binary'; readings?: ReadingName[] }
  /** What is computed so far while this machine computes the run, afterwards all of it. */
  | { kind: 'partial'; readings?: ReadingName[] }
  | { kind: 'csv'; readings?: ReadingName[] }
  | { kind: 'input' };

/** @throws Refusal 409 while the run has no numbers, 422 for a reading that it does not have; nothing is sent then */
export async function sendRunFile(
  { models, materials, pool, jobs }: Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'jobs'>,
  run: SweepRun,
  file: RunFile,
  response: Response,
): Promise<void> {
  switch (file.kind) {
    case 'binary': {
      const result = await RunResult.open(models, run);
      const readings = chooseReadings(run, file.readings);
      const bytes = resultByteLength(resultHeaderOf(run, readings));
      announce(response, bytes);
      await sendPieces(resultBytes(result, readings), response);
      releaseMemory(bytes);
      return;
    }
    case 'partial': {
      const soFar = run.state === 'done' ? null : jobs.partialResult(run.id);
      if (!soFar) {
        // It may have come to its end since the row was read.
        await run.reload({ attributes: ['state'] });
        return sendRunFile({ models, materials, pool, jobs }, run, { ...file, kind: 'binary' }, response);
      }
      const header = { ...resultHeaderOf(run, chooseReadings(run, file.readings)), done: soFar.done() };
      announce(response, resultByteLength(header));
      return sendPieces(partialResultBytes(run, soFar, header), response);
    }
    case 'csv': {
      const result = await RunResult.open(models, run);
      const readings = chooseReadings(run, file.readings);
      response.attachment(`${fileNameOf(run)}.csv`).type('text/csv; charset=utf-8');
      return sendPieces(resultCsv(result, readings), response);
    }
    case 'input': {
      const constants = await loadRunMaterials(materials, run);
      response.attachment(`${fileNameOf(run)}-input.json`).type('application/json');
      return sendPieces(runInputFile(pool, run.input, constants), response);
    }
  }
}

function announce(response: Response, bytes: number): void {
  response.set({
    'Content-Type': 'application/octet-stream',
    'Content-Length': String(bytes),
    'Cache-Control': 'no-store',
  });
}

const fileNameOf = (run: SweepRun) => plainFileName(run.name, 'run');
