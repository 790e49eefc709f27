import type { Bounds, Film } from './film.ts';

/** Step of the differences that give the slope, nm. */
const STEP_NM = 1e-3;
const ROUNDS = 8;
/** A step that leaves more than this share of the violation needs a new slope. */
const POOR = 0.3;
/** Films are led this far past the limit, in reflectance, so that rounding does not keep them before it. */
const MARGIN = 1e-9;

/**
 * Leads a film that lacks reflectance to the nearest one that does not, by Newton's method down the slope of what it lacks.
 * Good films mostly lie where the limit is just met; a search that only refuses what is beyond creeps along that
 * curved face. A film for which this fails comes back as it was.
 */
export function repaired(film: Film, bounds: Bounds, evaluate: (nm: number[]) => Film): Film {
  let at = film;
  let slope: number[] | null = null;
  for (let round = 0; round < ROUNDS; round += 1) {
    slope ??= slopeOf(at, bounds, evaluate);
    const steepness = slope.reduce((sum, one) => sum + one ** 2, 0);
    // Where a reading does not exist the violation jumps and no slope leads out.
    if (steepness === 0) return film;
    const length = (at.violation + MARGIN) / steepness;
    const nm = at.nm.map((one, i) => {
      const { fromNm, toNm } = bounds[i]!;
      return Math.min(toNm, Math.max(fromNm, one - length * slope![i]! * (toNm - fromNm)));
    });
    const next = evaluate(nm);
    if (next.violation === 0) return next;
    if (next.violation >= at.violation) return film;
    if (next.violation > POOR * at.violation) slope = null;
    at = next;
  }
  return film;
}

/** Change of the violation over the whole range of each thickness. */
function slopeOf({ nm, violation }: Film, bounds: Bounds, evaluate: (nm: number[]) => Film): number[] {
  return bounds.map(({ fromNm, toNm }, i) => {
    const step = nm[i]! + STEP_NM <= toNm ? STEP_NM : -STEP_NM;
    const moved = evaluate(nm.map((one, j) => (i === j ? one + step : one)));
    return ((moved.violation - violation) / step) * (toNm - fromNm);
  });
}
