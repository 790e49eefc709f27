import { nearestIndex, valueAt } from '../../../components/plot/curveValues.ts';

type Curve = { x: readonly number[]; y: readonly number[] };

/** Two curves on one grid: every sample of either, where both are known. x ascends. */
export type Overlap = { x: number[]; a: number[]; b: number[] };

/** Samples nearer than this share of x are one: tables round their wavelengths. */
const SAME = 1e-9;

/** Both curves where both are known, each linear between its samples; null where they have nothing in common. */
export function overlapOf(a: Curve, b: Curve): Overlap | null {
  const ends = [a.x, b.x].map((x) => [Math.min(...endsOf(x)), Math.max(...endsOf(x))] as const);
  const low = Math.max(...ends.map(([from]) => from));
  const high = Math.min(...ends.map(([, to]) => to));
  const all = [...a.x, ...b.x].filter((x) => x >= low && x <= high).sort((one, other) => one - other);
  const x = all.filter((value, index) => index === 0 || value - all[index - 1]! > SAME * value);
  if (x.length === 0) return null;
  return { x, a: x.map((value) => near(a, value)), b: x.map((value) => near(b, value)) };
}

function endsOf(x: readonly number[]): [number, number] {
  return [x[0] ?? NaN, x.at(-1) ?? NaN];
}

function near({ x, y }: Curve, value: number): number {
  const index = nearestIndex(x, value);
  const sample = x[index];
  return sample !== undefined && Math.abs(sample - value) <= SAME * value
    ? y[index]!
    : valueAt({ x, y }, value);
}

export const differenceModes = ['percent', 'ratio', 'difference'] as const;
export type DifferenceMode = (typeof differenceModes)[number];

/** Where the first curve is smaller than this share of its largest value, a ratio to it says nothing. */
const TOO_SMALL = 1e-3;

/** b against a, point by point; NaN where a is too near to zero for a ratio. */
export function differencesOf({ a, b }: Omit<Overlap, 'x'>, mode: DifferenceMode): number[] {
  const least = TOO_SMALL * Math.max(0, ...a.map(Math.abs).filter(Number.isFinite));
  return a.map((first, index) => {
    const second = b[index] ?? NaN;
    if (mode === 'difference') return second - first;
    if (Math.abs(first) <= least) return NaN;
    return mode === 'ratio' ? second / first : (100 * (second - first)) / Math.abs(first);
  });
}

/** The point at which two curves are farthest apart; null where neither is known. */
export function farthestApart({ a, b }: Pick<Overlap, 'a' | 'b'>): number | null {
  let farthest: number | null = null;
  let most = -1;
  a.forEach((first, index) => {
    const apart = Math.abs((b[index] ?? NaN) - first);
    if (apart > most) [farthest, most] = [index, apart];
  });
  return farthest;
}
