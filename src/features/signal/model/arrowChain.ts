import type { Complex } from '../../../../shared/complex.ts';
import type { ShareSum } from './shares.ts';

type Pixel = { x: number; y: number };
export type ArrowPlace = { from: Pixel; to: Pixel };

export type ArrowChain = {
  origin: Pixel;
  arrows: ArrowPlace[];
  total: Pixel;
  exact: Pixel;
  /** A length that is easy to read, and its width on the drawing. */
  scaleBar: { value: number; px: number };
};

/** Room around the arrows for their names, px. */
const MARGIN = { x: 44, y: 26 };

/**
 * The shares as arrows tip to tail in the complex plane, both axes on one scale, the real one to the right and the
 * imaginary one upward, as large as the room allows.
 */
export function arrowChain(sum: ShareSum, size: { width: number; height: number }): ArrowChain {
  const tips: Complex[] = [[0, 0]];
  for (const { value } of sum.shares) {
    const last = tips[tips.length - 1]!;
    tips.push([last[0] + value[0], last[1] + value[1]]);
  }
  const all = [...tips, sum.total, sum.exact];
  const [left, right] = rangeOf(all.map(([re]) => re));
  const [low, high] = rangeOf(all.map(([, im]) => im));
  const pxPerUnit = Math.min(
    (size.width - 2 * MARGIN.x) / (right - left || Number.MIN_VALUE),
    (size.height - 2 * MARGIN.y) / (high - low || Number.MIN_VALUE),
  );
  const scale = Number.isFinite(pxPerUnit) ? pxPerUnit : 0;
  const place = ([re, im]: Complex): Pixel => ({
    x: size.width / 2 + (re - (left + right) / 2) * scale,
    y: size.height / 2 - (im - (low + high) / 2) * scale,
  });
  const bar = scale > 0 ? roundLength(70 / scale) : 0;
  return {
    origin: place([0, 0]),
    arrows: sum.shares.map((_, index) => ({ from: place(tips[index]!), to: place(tips[index + 1]!) })),
    total: place(sum.total),
    exact: place(sum.exact),
    scaleBar: { value: bar, px: bar * scale },
  };
}

function rangeOf(values: readonly number[]): [number, number] {
  let [low, high] = [Infinity, -Infinity];
  for (const value of values) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return [low, high];
}

/** The largest of 1, 2 or 5 times a power of ten up to a length. */
function roundLength(length: number): number {
  const power = 10 ** Math.floor(Math.log10(length));
  const lead = [5, 2, 1].find((one) => one * power <= length) ?? 1;
  return Number((lead * power).toPrecision(3));
}

/** More arrows than this are told apart by pointing at them, not by their names. */
const NAMED = 12;

/** Which arrows carry their names: all, or the first and the last and the one that is pointed at. */
export function namedArrows(count: number, active: number | null): ReadonlySet<number> {
  const ends = [0, count - 1, ...(active === null ? [] : [active])];
  return new Set(count <= NAMED ? Array.from({ length: count }, (_, index) => index) : ends);
}
