/** Curves for drawing: x ascending or descending, y may hold NaN where there is no value. */
export type Curve = { x: ArrayLike<number>; y: ArrayLike<number> };
export type Drawn = { x: number[]; y: number[] };

/**
 * Thins a curve to what `buckets` pixel columns can show: of the samples of each column the first, the lowest,
 * the highest and the last stay, in their order, so that no peak and no step is lost. A run of NaN stays as one
 * NaN, which breaks the line. One sample either side of the window stays too, so that the line runs to its edge.
 *
 * @param from, to window on x, in either order
 */
export function decimateMinMax({ x, y }: Curve, from: number, to: number, buckets: number): Drawn {
  const [start, end] = windowIndices(x, Math.min(from, to), Math.max(from, to));
  const kept: Drawn = { x: [], y: [] };
  const keep = (index: number) => {
    kept.x.push(x[index]!);
    kept.y.push(y[index]!);
  };
  const count = end - start;
  if (count <= 4 * buckets) {
    for (let index = start; index < end; index++) keep(index);
    return kept;
  }
  // Columns of equal width on x, not of equal count: a log grid has most of its samples at one end.
  const x0 = x[start]!;
  const perBucket = (x[end - 1]! - x0) / buckets;
  let index = start;
  while (index < end) {
    const bucket = Math.floor((x[index]! - x0) / perBucket);
    let next = index + 1;
    while (next < end && Math.floor((x[next]! - x0) / perBucket) === bucket) next++;
    for (const chosen of extremes(y, index, next)) keep(chosen);
    index = next;
  }
  return kept;
}

/** Indices of the first, lowest, highest and last value and of one gap in [start, end), ascending, each once. */
function extremes(y: ArrayLike<number>, start: number, end: number): number[] {
  let low = -1;
  let high = -1;
  let gap = -1;
  for (let index = start; index < end; index++) {
    const value = y[index]!;
    if (Number.isNaN(value)) {
      gap = index;
      continue;
    }
    if (low < 0 || value < y[low]!) low = index;
    if (high < 0 || value > y[high]!) high = index;
  }
  const chosen = [start, low, high, gap, end - 1].filter((index) => index >= 0).sort((a, b) => a - b);
  return chosen.filter((index, position) => index !== chosen[position - 1]);
}

/** The samples inside [low, high] and one either side, as a half-open range. `x` runs in one direction. */
function windowIndices(x: ArrayLike<number>, low: number, high: number): [number, number] {
  const ascending = x.length < 2 || x[x.length - 1]! >= x[0]!;
  const before = ascending ? low : high;
  const after = ascending ? high : low;
  const first = firstIndex(x.length, (index) => (ascending ? x[index]! >= before : x[index]! <= before));
  const last = firstIndex(x.length, (index) => (ascending ? x[index]! > after : x[index]! < after));
  return [Math.max(0, first - 1), Math.min(x.length, last + 1)];
}

/** Binary search: the first index in [0, length) for which `holds` is true, or length. */
export function firstIndex(length: number, holds: (index: number) => boolean): number {
  let low = 0;
  let high = length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (holds(middle)) high = middle;
    else low = middle + 1;
  }
  return low;
}
