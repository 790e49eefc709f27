import { foldDegrees } from '../../../../shared/units.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';

/** Where a value stands on a grid: at the share between two of its indices, or at the first of them with share 0. */
export type GridShare = { low: number; high: number; share: number };

/** Two values of an axis are the same within the rounding of how a grid is made. */
export function sameValue(a: number, b: number): boolean {
  return a === b || Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));
}

/** The place of a value on a grid that runs in one direction; null outside of it. */
export function shareOf(grid: ArrayLike<number>, value: number): GridShare | null {
  const near = nearestIndex(grid, value);
  if (near < 0) return null;
  const at = grid[near]!;
  if (sameValue(at, value)) return { low: near, high: near, share: 0 };
  const ascending = grid[grid.length - 1]! >= grid[0]!;
  const other = at < value === ascending ? near + 1 : near - 1;
  if (other < 0 || other >= grid.length) return null;
  return { low: near, high: other, share: (value - at) / (grid[other]! - at) };
}

/** As `shareOf`, but on a grid of an axis that counts (repeats) only where it has the value itself. */
export function placeOn(grid: ArrayLike<number>, value: number, discrete: boolean): GridShare | null {
  const place = shareOf(grid, value);
  return discrete && place !== null && place.share !== 0 ? null : place;
}

/**
 * Linear between two values; a value met exactly stays, whatever is beside it. A rotation takes the shorter way, since
 * an ellipse turned by 180 deg is the same.
 */
export function between(a: number, b: number, share: number, turns: boolean): number {
  if (share === 0) return a;
  return turns ? foldDegrees(a + share * foldDegrees(b - a)) : a + share * (b - a);
}
