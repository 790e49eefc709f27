import type { SolvePoint } from '../../../../shared/solve.ts';
import type { FilmLayer } from './filmLayers.ts';

export type Depth = NonNullable<SolvePoint['depth']>;
export const profileQuantities = ['field', 'absorbed', 'signal'] as const;
export type ProfileQuantity = (typeof profileQuantities)[number];

/** A curve against depth: one for each light, or one for both. */
export type ProfileCurve = { name: string; light: 'p' | 's' | null; values: readonly number[] };

export function profileCurves(depth: Depth, quantity: ProfileQuantity): ProfileCurve[] {
  switch (quantity) {
    case 'field':
      return lights(depth.field, '|E|');
    case 'absorbed':
      return lights(depth.absorbedPerNm, 'absorbed');
    case 'signal': {
      const values = depth.signalPerNm.map(([re, im]) => Math.hypot(re, im));
      return [{ name: 'signal', light: null, values }];
    }
  }
}

function lights(values: { p: number[]; s: number[] }, name: string): ProfileCurve[] {
  return [
    { name: `${name} p`, light: 'p', values: values.p },
    { name: `${name} s`, light: 's', values: values.s },
  ];
}

/** The depth scale of the drawing: compressed from layer to layer, even within each. */
export type DepthScale = {
  toPixel: (depthNm: number) => number;
  /** Top and height of each layer, px. */
  rows: { layer: FilmLayer; top: number; height: number }[];
  /** Where the substrate begins, and the whole height. */
  filmPx: number;
  height: number;
};

/**
 * @param heights of the layers, px, by the function that the cross-section has them from
 * @param deepestNm how far into the substrate there are values, as a depth from the surface
 * @param substratePx height that the substrate is given
 */
export function depthScale(
  film: readonly FilmLayer[],
  heights: readonly number[],
  deepestNm: number,
  substratePx: number,
): DepthScale {
  let top = 0;
  const rows = film.map((layer, index) => {
    const row = { layer, top, height: heights[index] ?? 0 };
    top += row.height;
    return row;
  });
  const last = film[film.length - 1];
  const filmNm = last ? last.topNm + last.thicknessNm : 0;
  const filmPx = top;
  const toPixel = (depthNm: number) => {
    if (depthNm >= filmNm) {
      const inside = Math.max(deepestNm - filmNm, Number.MIN_VALUE);
      return filmPx + Math.min(1, (depthNm - filmNm) / inside) * substratePx;
    }
    const row = rows[Math.max(0, firstAfter(film, depthNm) - 1)]!;
    const { topNm, thicknessNm } = row.layer;
    const share = thicknessNm > 0 ? (depthNm - topNm) / thicknessNm : 0;
    return row.top + Math.min(1, Math.max(0, share)) * row.height;
  };
  return { toPixel, rows, filmPx, height: filmPx + substratePx };
}

/** Index of the first layer that begins below a depth. */
function firstAfter(film: readonly FilmLayer[], depthNm: number): number {
  let [low, high] = [0, film.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (film[middle]!.topNm > depthNm) high = middle;
    else low = middle + 1;
  }
  return low;
}

/** The layer at a depth; null in the substrate. */
export function layerAt(film: readonly FilmLayer[], depthNm: number): FilmLayer | null {
  const layer = film[firstAfter(film, depthNm) - 1];
  return layer && depthNm <= layer.topNm + layer.thicknessNm ? layer : null;
}
