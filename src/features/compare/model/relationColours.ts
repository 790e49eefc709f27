import type { ColourDomain } from '../../../components/plot/map/mapRange.ts';
import type { Relation } from './curveDifference.ts';

/**
 * Near a zero of the reference ratios grow without limit: where the largest is this many times the ratio below which
 * nearly all lie, the colours end there.
 */
const FAR_OUT = 3;
const NEARLY_ALL = 0.98;

/** Differences below this share of the values are the rounding of doubles and would be drawn as a picture of noise. */
const ROUNDING = 1e-12;

/**
 * Colours of a difference about 0, of a ratio about 1, so that the sign is seen; with how many values lie beyond them.
 */
export function relationColours(
  relation: Relation,
  related: ArrayLike<number>,
  reference: ArrayLike<number>,
): ColourDomain & { beyond: number } {
  const centre = relation === 'ratio' ? 1 : 0;
  const sizes = Float64Array.from(related, (value) => Math.abs(value - centre))
    .filter((size) => !Number.isNaN(size))
    .sort();
  const last = sizes.length - 1;
  const largest = sizes[last] ?? 0;
  const usual = sizes[Math.floor(NEARLY_ALL * last)] ?? 0;
  const found = relation === 'ratio' && largest > FAR_OUT * usual ? usual : largest;
  const scale = relation === 'ratio' ? 1 : largestOf(reference);
  const size = found > ROUNDING * scale ? found : scale || 1;
  const beyond = sizes.length - 1 - sizes.findLastIndex((one) => one <= size);
  return { low: centre - size, high: centre + size, signed: true, beyond };
}

function largestOf(values: ArrayLike<number>): number {
  let largest = 0;
  for (let index = 0; index < values.length; index++) {
    const size = Math.abs(values[index]!);
    if (size > largest) largest = size;
  }
  return largest;
}
