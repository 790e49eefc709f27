import { firstIndex } from './decimate.ts';
import type { Curve } from './decimate.ts';

/** Index of the sample nearest to `value`; -1 for an empty curve. `x` runs in one direction. */
export function nearestIndex(x: ArrayLike<number>, value: number): number {
  if (x.length === 0) return -1;
  const ascending = x[x.length - 1]! >= x[0]!;
  const after = firstIndex(x.length, (index) => (ascending ? x[index]! >= value : x[index]! <= value));
  if (after === 0) return 0;
  if (after === x.length) return x.length - 1;
  return Math.abs(x[after]! - value) < Math.abs(x[after - 1]! - value) ? after : after - 1;
}

/**
 * The curve's value at x: the sample there, else linear between its neighbours. NaN outside the curve and beside
 * a gap.
 */
export function valueAt({ x, y }: Curve, value: number): number {
  const near = nearestIndex(x, value);
  if (near < 0) return NaN;
  if (x[near] === value) return y[near]!;
  const ascending = x[x.length - 1]! >= x[0]!;
  const other = x[near]! < value === ascending ? near + 1 : near - 1;
  if (other < 0 || other >= x.length) return NaN;
  const share = (value - x[near]!) / (x[other]! - x[near]!);
  return y[near]! + share * (y[other]! - y[near]!);
}

/** Lowest and highest value of a curve within a window on x; `positive` leaves out what a log axis cannot show. */
export function rangeWithin(
  curve: Curve,
  low: number,
  high: number,
  absolute: boolean,
): [number, number] | null {
  let least = Infinity;
  let most = -Infinity;
  for (let index = 0; index < curve.x.length; index++) {
    const at = curve.x[index]!;
    if (at < low || at > high) continue;
    const value = absolute ? Math.abs(curve.y[index]!) : curve.y[index]!;
    if (Number.isNaN(value) || (absolute && value === 0)) continue;
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return least <= most ? [least, most] : null;
}
