import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import type { RandomGenerator } from 'pure-rand/types/RandomGenerator';
import type { Bounds, Film } from './film.ts';

/** Share of the thicknesses that a trial takes from the mutant; thicknesses of interference films depend on each other. */
const CROSSOVER = 0.9;
/** The factor on differences is drawn anew for each trial from here to 1, against getting stuck. */
const LEAST_FACTOR = 0.5;

/** Thicknesses all over the bounds, one in each of `count` equal parts of every variable (Latin hypercube). */
export function scattered(bounds: Bounds, count: number, random: RandomGenerator): number[][] {
  const columns = bounds.map(({ fromNm, toNm }) => {
    const parts = Array.from({ length: count }, (_, i) => i);
    for (let last = count - 1; last > 0; last -= 1) {
      const other = uniformInt(random, 0, last);
      [parts[last], parts[other]] = [parts[other]!, parts[last]!];
    }
    return parts.map((part) => fromNm + ((toNm - fromNm) * (part + uniformFloat64(random))) / count);
  });
  return Array.from({ length: count }, (_, i) => columns.map((column) => column[i]!));
}

/**
 * One trial for each film: DE/rand/1/bin of R. Storn and K. Price, J. Global Optim. 11, 341 (1997). Beyond a bound a
 * thickness falls between its base and the bound (K. Price, R. Storn and J. Lampinen, Differential Evolution (2005)), so
 * that films do not pile up at the bounds.
 */
export function trialsOf(films: readonly Film[], bounds: Bounds, random: RandomGenerator): number[][] {
  return films.map(({ nm }, position) => {
    const [base, plus, minus] = threeOthers(films.length, position, random).map((i) => films[i]!.nm);
    const factor = LEAST_FACTOR + (1 - LEAST_FACTOR) * uniformFloat64(random);
    const always = uniformInt(random, 0, bounds.length - 1);
    return bounds.map(({ fromNm, toNm }, i) => {
      // Both numbers are drawn for every variable, so that the sequence does not depend on the outcome.
      const crosses = uniformFloat64(random) < CROSSOVER || i === always;
      const share = uniformFloat64(random);
      if (!crosses) return nm[i]!;
      const from = base![i]!;
      const mutant = from + factor * (plus![i]! - minus![i]!);
      if (mutant < fromNm) return from + share * (fromNm - from);
      if (mutant > toNm) return from + share * (toNm - from);
      return mutant;
    });
  });
}

function threeOthers(count: number, position: number, random: RandomGenerator): number[] {
  const taken = [position];
  while (taken.length < 4) {
    const drawn = uniformInt(random, 0, count - 1);
    if (!taken.includes(drawn)) taken.push(drawn);
  }
  return taken.slice(1);
}
