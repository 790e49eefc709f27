/** A function of one variable on a grid, and where it passes through 0 between the points of the grid. */

export type SignChange = { at: number; rising: boolean };

/** Whether a value is rounding, of which nothing is known but that it is about 0. */
type IsNothing = (value: number, position: number) => boolean;

/** A bracket is halved until it is as narrow as this. */
const WIDTH = 1e-10;
/** How much smaller the function must have become there: at a pole it grows, at a fold it stays. */
const SHRUNK = 0.05;
/** Steps of the search for an extreme between the points of the grid. */
const GOLDEN_STEPS = 30;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * All passages through 0, in the order of the grid. Two that lie between neighbouring points are found where |f| has
 * a least value there. Poles and folds change the sign too, but not through 0, and are left out.
 *
 * @param f at any place between the ends of the grid
 * @param values of f on the grid
 * @param isNothing whether a value says nothing of the sign
 */
export function signChanges(
  f: (x: number) => number,
  grid: readonly number[],
  values: readonly number[],
  isNothing: IsNothing,
): SignChange[] {
  // At 0 and where there is no value nothing is known of the sign; the neighbours on either side decide.
  const points: { x: number; y: number }[] = [];
  grid.forEach((x, position) => {
    const y = values[position]!;
    if (y !== 0 && !Number.isNaN(y) && !isNothing(y, position)) points.push({ x, y });
  });
  const ends = points.flatMap((point, position) => {
    const [before, after] = [points[position - 1], points[position + 1]];
    if (!before || !after) return [point];
    const dips = Math.abs(point.y) < Math.abs(before.y) && Math.abs(point.y) < Math.abs(after.y);
    const sameSign = point.y > 0 === before.y > 0 && point.y > 0 === after.y > 0;
    if (!dips || !sameSign) return [point];
    const least = leastBetween((x) => Math.sign(point.y) * f(x), before.x, after.x);
    const other = { x: least, y: f(least) };
    if (other.y > 0 === point.y > 0 || isNothing(other.y, position)) return [point];
    return other.x < point.x ? [other, point] : [point, other];
  });
  return ends.slice(1).flatMap((end, index) => {
    const start = ends[index]!;
    return start.y > 0 === end.y > 0 ? [] : (passage(f, start, end) ?? []);
  });
}

function passage(
  f: (x: number) => number,
  start: { x: number; y: number },
  end: { x: number; y: number },
): SignChange | null {
  let [low, high] = [start, end];
  const rising = end.y > 0;
  while (high.x - low.x > WIDTH) {
    const x = (low.x + high.x) / 2;
    const y = f(x);
    if (y === 0) return { at: x, rising };
    if (Number.isNaN(y)) return null;
    if (y > 0 === low.y > 0) low = { x, y };
    else high = { x, y };
  }
  const before = Math.max(Math.abs(start.y), Math.abs(end.y));
  const after = Math.max(Math.abs(low.y), Math.abs(high.y));
  if (after > SHRUNK * before) return null;
  // Between the two the function is a straight line.
  return { at: low.x + ((high.x - low.x) * Math.abs(low.y)) / (Math.abs(low.y) + Math.abs(high.y)), rising };
}

/** Place of the least value between two ends, by golden section; only as exact as a least value can be found. */
export function leastBetween(f: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [a, b] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [atA, atB] = [f(a), f(b)];
  for (let step = 0; step < GOLDEN_STEPS; step += 1) {
    if (atA < atB) {
      [high, b, atB] = [b, a, atA];
      a = high - GOLDEN * (high - low);
      atA = f(a);
    } else {
      [low, a, atA] = [a, b, atB];
      b = low + GOLDEN * (high - low);
      atB = f(b);
    }
  }
  return (low + high) / 2;
}
