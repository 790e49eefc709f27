import type { DesignResult } from '../../shared/design.ts';
import { designResultSchema } from '../../shared/design.ts';
import { conflict } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { DesignRun } from '../models/run.ts';

/**
 * The stored answer, JSON in UTF-8, piece by piece.
 *
 * @throws Refusal 409 while there is none
 */
export async function openDesignResult(models: Models, design: DesignRun): Promise<AsyncGenerator<Buffer>> {
  if (design.state !== 'done') throw conflict(`The design is ${design.state}: it has no answer.`);
  const chunks = await models.RunChunk.findAll({
    where: { runId: design.id },
    attributes: ['position'],
    order: ['position'],
  });
  if (chunks.length === 0) throw new Error(`The answer of design ${design.id} is missing.`);
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
