import type { AngleFeatures } from '../../shared/live.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { AngleReadings } from './angleReadings.ts';
import { leastBetween, signChanges } from './signChanges.ts';

/** Steps of the grid, deg: of sharp films, and of those whose points take long. */
const STEP_DEG = 0.05;
const SLOW_STEP_DEG = 0.5;
/** Nothing is reflected beyond; the last point of the grid. */
const LAST_DEG = 89.99;

/** A part of rotation and ellipticity together that is the rounding of the other. */
const ROUNDING = 1e-12;
/** Below this, deg, an angle is 0: about what a Q of 1e-17 turns. */
const NOTHING_DEG = 1e-15;
/** A film that reflects no p light at any angle has no angle at which it reflects least. */
const NO_REFLECTANCE = 1e-20;

/** Half widths at which the slope of R_p is taken, deg, each a check of the one before. */
const SLOPE_STEPS_DEG = [0.1, 0.02, 0.004, 0.0008];
const AGREE_DEG = 2e-8;

const angleNames = ['rotationP', 'ellipticityP', 'rotationS', 'ellipticityS'] as const;

/**
 * Angles of incidence at which something happens, for the film at its working point's wavelength and magnetization.
 *
 * @param materials by `${id}@${version}`
 * @throws ResolutionError when a material is not known at that wavelength
 */
export function angleFeatures(
  document: StackDocument,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): AngleFeatures {
  const film = new AngleReadings(document, materials, ['reflectanceP', ...angleNames]);
  const step = film.isSlow ? SLOW_STEP_DEG : STEP_DEG;
  const grid = Array.from({ length: Math.floor(LAST_DEG / step) + 1 }, (_, index) => index * step);
  grid.push(LAST_DEG);
  const points = grid.map((angle) => film.at(angle));
  const changes = angleNames.flatMap((reading) => {
    const isP = reading.endsWith('P');
    const [rotation, ellipticity] = isP ? angleNames : angleNames.slice(2);
    const isNothing = (value: number, position: number) => {
      const { [rotation]: one = 0, [ellipticity]: other = 0 } = points[position]!;
      return Math.abs(value) < NOTHING_DEG + ROUNDING * Math.hypot(one, other);
    };
    return signChanges(
      (angle) => film.at(angle)[reading],
      grid,
      points.map((point) => point[reading]),
      isNothing,
    ).map(({ at, rising }) => ({ reading, angleDeg: at, rising }));
  });
  return {
    pseudoBrewster: pseudoBrewster(
      (angle) => film.at(angle).reflectanceP,
      grid,
      points.map(({ reflectanceP }) => reflectanceP),
    ),
    signChanges: changes,
  };
}

/**
 * The least R_p inside of the grid. A least value itself is flat, so that its place is known to half the digits only:
 * it is where the slope is 0, and the slope comes from differences of fourth order.
 */
function pseudoBrewster(
  reflectance: (angleDeg: number) => number,
  grid: readonly number[],
  values: readonly number[],
): AngleFeatures['pseudoBrewster'] {
  const least = values.indexOf(Math.min(...values));
  if (least <= 0 || least === grid.length - 1 || Math.max(...values) < NO_REFLECTANCE) return null;
  const near = leastBetween(reflectance, grid[least - 1]!, grid[least + 1]!);
  let found = near;
  for (const step of SLOPE_STEPS_DEG) {
    const refined = slopeZero(reflectance, near, step);
    if (refined === null) continue;
    const agrees = Math.abs(refined - found) < AGREE_DEG;
    found = refined;
    if (agrees) break;
  }
  return { angleDeg: found, reflectanceP: reflectance(found) };
}

/** Where the slope, which rises through a least value, is 0 within one step of `near`; null when it is not there. */
function slopeZero(f: (x: number) => number, near: number, h: number): number | null {
  if (near - 3 * h < 0 || near + 3 * h > LAST_DEG) return null;
  const slope = (x: number) => 8 * (f(x + h) - f(x - h)) - (f(x + 2 * h) - f(x - 2 * h));
  let [low, high] = [near - h, near + h];
  if (!(slope(low) < 0 && slope(high) > 0)) return null;
  while (high - low > 1e-11) {
    const middle = (low + high) / 2;
    if (slope(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
