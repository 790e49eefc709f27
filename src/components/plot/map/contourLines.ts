import type { MapData } from './mapTypes.ts';

/** One level as loose segments: x1, y1, x2, y2 in grid positions (0 is the first value of an axis). */
export type Contour = { level: number; segments: number[] };

/** Cells along an axis that contours are looked for in; finer ones cannot be seen. */
const CELLS = 240;

/**
 * Contours by marching squares, each cell cut along straight lines. A cell beside a missing value has none, so that
 * a map with holes, or one still being computed, gets no line around them.
 */
export function contourLines({ x, y, values }: MapData, levels: readonly number[]): Contour[] {
  const [columns, rows] = [positions(x.length), positions(y.length)];
  const contours = levels.map((level): Contour => ({ level, segments: [] }));
  for (let j = 0; j + 1 < rows.length; j++) {
    for (let i = 0; i + 1 < columns.length; i++) {
      const [left, right, bottom, top] = [columns[i]!, columns[i + 1]!, rows[j]!, rows[j + 1]!];
      const a = values[bottom * x.length + left]!;
      const b = values[bottom * x.length + right]!;
      const c = values[top * x.length + right]!;
      const d = values[top * x.length + left]!;
      const least = Math.min(a, b, c, d);
      const most = Math.max(a, b, c, d);
      // Also false where one of them is NaN.
      if (!(most > least)) continue;
      for (const { level, segments } of contours) {
        if (level <= least || level > most) continue;
        cutCell(segments, level, { left, right, bottom, top, a, b, c, d });
      }
    }
  }
  return contours;
}

/** Every grid position, or about CELLS of them with both ends. */
function positions(count: number): number[] {
  const cells = Math.min(CELLS, count - 1);
  return Array.from({ length: Math.max(0, cells) + 1 }, (_, index) =>
    Math.round((index * (count - 1)) / Math.max(1, cells)),
  );
}

type Cell = Record<'left' | 'right' | 'bottom' | 'top' | 'a' | 'b' | 'c' | 'd', number>;

/** Corners run a (left, bottom), b (right, bottom), c (right, top), d (left, top). */
function cutCell(segments: number[], level: number, cell: Cell): void {
  const { left, right, bottom, top, a, b, c, d } = cell;
  const along = (from: number, to: number, low: number, high: number) =>
    low + ((level - from) / (to - from)) * (high - low);
  const crossings: number[] = [];
  if (a >= level !== b >= level) crossings.push(along(a, b, left, right), bottom);
  if (b >= level !== c >= level) crossings.push(right, along(b, c, bottom, top));
  if (d >= level !== c >= level) crossings.push(along(d, c, left, right), top);
  if (a >= level !== d >= level) crossings.push(left, along(a, d, bottom, top));
  if (crossings.length === 4) segments.push(...crossings);
  if (crossings.length !== 8) return;
  // A saddle: the mean of the corners says which two of them are joined.
  const [p, q, r, s] = [0, 2, 4, 6].map((at) => crossings.slice(at, at + 2)) as [
    number[],
    number[],
    number[],
    number[],
  ];
  const joined = (a + b + c + d) / 4 >= level === a >= level;
  if (joined) segments.push(...p, ...q, ...r, ...s);
  else segments.push(...p, ...s, ...q, ...r);
}
