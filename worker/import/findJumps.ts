/** So many times the spread of its four neighbours may a value lie outside of them. */
const MOST_SPREADS = 4;
/** ... and by less than this part of the whole column it is no matter. */
const LEAST_PART = 0.05;

/**
 * Positions of values that stand alone: far outside the interval of their two neighbours on each side, although
 * those agree. A steep but steady curve, whose values lie between their neighbours, has none.
 *
 * Common practice, no source.
 *
 * @param x rising
 */
export function findJumps(x: readonly number[], y: readonly number[]): number[] {
  const span = rangeOf(y);
  const jumps: number[] = [];
  for (let i = 0; i < y.length; i += 1) {
    if (isBetween(y[i]!, y[i - 1], y[i + 1])) continue;
    const positions = [i - 2, i - 1, i + 1, i + 2].filter((at) => at >= 0 && at < y.length);
    if (positions.length < 3) continue;
    const neighbours = positions.map((at) => y[at]!);
    const [least, greatest] = [Math.min(...neighbours), Math.max(...neighbours)];
    const outside = Math.max(least - y[i]!, y[i]! - greatest);
    if (
      outside > MOST_SPREADS * (greatest - least) &&
      outside > LEAST_PART * span &&
      isCloseBy(x, i, positions)
    ) {
      jumps.push(i);
    }
  }
  return jumps;
}

function isBetween(value: number, before: number | undefined, after: number | undefined): boolean {
  if (before === undefined || after === undefined) return false;
  return before <= value === value <= after;
}

/** Neighbours across a gap of the table say nothing about a value. */
function isCloseBy(x: readonly number[], i: number, positions: number[]): boolean {
  return positions.every((at) => Math.abs(x[at]! - x[i]!) <= 0.2 * x[i]!);
}

function rangeOf(values: readonly number[]): number {
  let least = Infinity;
  let greatest = -Infinity;
  for (const value of values) {
    least = Math.min(least, value);
    greatest = Math.max(greatest, value);
  }
  return greatest - least;
}
