import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { mersenne } from 'pure-rand/generator/mersenne';

/**
 * Standard normal numbers for one sample: the same for the same seed and sample on any machine, in whatever order the
 * samples are drawn and however they are shared out over cores.
 *
 * @returns a function that gives the next number
 */
export function normalNumbers(seed: number, sample: number): () => number {
  const generator = mersenne(mixed(seed, sample));
  let spare: number | null = null;
  return () => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    // G. E. P. Box and M. E. Muller, Ann. Math. Stat. 29, 610 (1958); 1 - u keeps the logarithm finite.
    const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(generator)));
    const angle = 2 * Math.PI * uniformFloat64(generator);
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
}

/** Spreads seed and sample over 32 bits, so that neighbouring samples start far apart (finalizer of MurmurHash3, public domain). */
function mixed(seed: number, sample: number): number {
  let h = Math.imul(seed ^ 0x9e3779b9, 0x85ebca6b) ^ sample;
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35);
  return (h ^ (h >>> 16)) >>> 0;
}
