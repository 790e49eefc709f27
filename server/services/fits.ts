import type { z } from 'zod';
import type { FitResult, fitMaterialSchema } from '../../shared/materialFit.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid, tooManyRequests } from '../errors.ts';
import { findMaterial } from './findMaterial.ts';

/** Fits of one person at a time: each takes a thread for up to a minute. */
const MOST_FITS = 2;

/** How many fits each person waits for, in this process. */
const underWay = new Map<string, number>();

/**
 * Fits a model to the tabulated points of a material that the group can use.
 *
 * @param signal aborted when nobody waits for the answer any more
 * @throws Refusal 422 with issues at the fields of the request, 429
 */
export async function fitMaterialOf(
  { models, materials, pool }: Pick<Dependencies, 'models' | 'materials' | 'pool'>,
  actor: { userId: string },
  groupId: string,
  { material, version, ...wanted }: z.output<typeof fitMaterialSchema>,
  signal: AbortSignal,
): Promise<FitResult> {
  const found = await findMaterial({ models, materials }, groupId, { material, version });
  if (!found) {
    throw invalid([{ path: 'material', message: 'there is no such version of a material in this group' }]);
  }
  const mine = underWay.get(actor.userId) ?? 0;
  if (mine >= MOST_FITS) throw tooManyRequests(`You wait for ${mine} fits already. Let one end first.`);
  underWay.set(actor.userId, mine + 1);
  try {
    return await pool.fit({ ...wanted, content: found.content }, { signal });
  } finally {
    const left = (underWay.get(actor.userId) ?? 1) - 1;
    if (left > 0) underWay.set(actor.userId, left);
    else underWay.delete(actor.userId);
  }
}
