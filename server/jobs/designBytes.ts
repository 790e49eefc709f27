import type { DesignResult } from '../../shared/design.ts';
import { designResultSchema } from '../../shared/design.ts';
import { formatPath } from '../../shared/issues.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';

/**
 * The answer to a design question as JSON in UTF-8.
 *
 * @throws ComputeError `refused` where a number is none: it would be stored as null and could not be read again
 */
export function designBytes(result: DesignResult): Buffer {
  const parsed = designResultSchema.safeParse(result);
  if (parsed.success) return Buffer.from(JSON.stringify(parsed.data), 'utf8');
  const place = endlessNumberIn(result);
  if (place === null) throw parsed.error;
  throw new ComputeError(
    'refused',
    `The answer holds a number that is not finite (${formatPath(place)}): a thickness, wavelength or constant of this film is beyond what can be computed. Look for one that is far out of the ordinary, change it and ask again.`,
  );
}

/** Where the first number is that is none. */
function endlessNumberIn(value: unknown): (string | number)[] | null {
  if (typeof value === 'number') return Number.isFinite(value) ? null : [];
  if (typeof value !== 'object' || value === null) return null;
  for (const [key, inner] of Object.entries(value)) {
    const place = endlessNumberIn(inner);
    if (place) return [Array.isArray(value) ? Number(key) : key, ...place];
  }
  return null;
}
