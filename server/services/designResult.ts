import type { DesignResult } from '../../shared/design.ts';
import { designResultSchema } from '../../shared/design.ts';
import { conflict } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { DesignRun } from '../models/run.ts';

/**
 * The stored answer, JSON in UTF-8, piece by piece.
 *
 * @param take `unfinished` also takes what was found by a design that was cancelled or failed
 * @throws Refusal 409 while there is none
 */
export async function openDesignResult(
  models: Models,
  design: DesignRun,
  take: 'finished' | 'unfinished' = 'finished',
): Promise<AsyncGenerator<Buffer>> {
  const none = () => conflict(`The design is ${design.state}: it has no answer.`);
  if (design.state !== 'done' && take === 'finished') throw none();
  const chunks = await models.RunChunk.findAll({
    where: { runId: design.id },
    attributes: ['position'],
    order: ['position'],
  });
  if (chunks.length === 0) {
    throw design.state === 'done' ? new Error(`The answer of design ${design.id} is missing.`) : none();
  }
  return pieces();

  async function* pieces(): AsyncGenerator<Buffer> {
    for (const { position } of chunks) {
      const chunk = await models.RunChunk.findOne({ where: { runId: design.id, position } });
      if (!chunk) throw new Error(`Piece ${position} of design ${design.id} is missing.`);
      yield chunk.bytes;
    }
  }
}

/** @throws Refusal 409 while there is none */
export async function readDesignResult(models: Models, design: DesignRun): Promise<DesignResult> {
  const parts: Buffer[] = [];
  for await (const piece of await openDesignResult(models, design)) parts.push(piece);
  return designResultSchema.parse(JSON.parse(Buffer.concat(parts).toString('utf8')));
}
