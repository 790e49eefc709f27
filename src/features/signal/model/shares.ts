import type { Complex } from '../../../../shared/complex.ts';
import type { SolvePoint } from '../../../../shared/solve.ts';
import type { FilmLayer } from './filmLayers.ts';

export type Contributions = NonNullable<SolvePoint['contributions']>;
export const amplitudes = ['sp', 'ps', 'pp'] as const;
export type Amplitude = (typeof amplitudes)[number];

/** What one layer adds to an amplitude, to first order in Q. */
export type Share = {
  /** Position in the film, unique. */
  key: string;
  label: string;
  layerId: string | null;
  value: Complex;
};

export type ShareSum = {
  shares: Share[];
  total: Complex;
  exact: Complex;
  /** |exact - total| */
  difference: number;
};

/** The substrate's place among the layers of a drawing. */
export const SUBSTRATE_KEY = 'substrate';

/**
 * The layers' shares of one amplitude, from the surface down. The slices of a graded interface count to the layer
 * below it.
 */
export function sharesOf(
  contributions: Contributions,
  film: readonly FilmLayer[],
  substrateName: string,
  amplitude: Amplitude,
): ShareSum {
  const byPath = new Map<string, { layer: FilmLayer; key: string }[]>();
  for (const [index, layer] of film.entries()) {
    const there = byPath.get(layer.path);
    const occurrence = { layer, key: String(index) };
    if (there) there.push(occurrence);
    else byPath.set(layer.path, [occurrence]);
  }
  const shares = new Map<string, Share>();
  for (const entry of contributions.layers) {
    const place = entry.path === SUBSTRATE_KEY ? null : occurrenceAt(byPath.get(entry.path), entry.depthNm);
    const key = place?.key ?? SUBSTRATE_KEY;
    const [re, im] = entry[amplitude];
    const before = shares.get(key)?.value ?? [0, 0];
    shares.set(key, {
      key,
      label: place?.layer.label ?? substrateName,
      layerId: place?.layer.layerId ?? null,
      value: [before[0] + re, before[1] + im],
    });
  }
  const total = contributions.total[amplitude];
  const exact = contributions.exact[amplitude];
  return {
    shares: [...shares.values()].filter(({ value }) => modulus(value) > 0),
    total,
    exact,
    difference: Math.hypot(exact[0] - total[0], exact[1] - total[1]),
  };
}

/** Which repetition of a layer lies at this depth: the last whose graded zone has begun there. */
function occurrenceAt(
  occurrences: { layer: FilmLayer; key: string }[] | undefined,
  depthNm: number,
): { layer: FilmLayer; key: string } | null {
  if (!occurrences) return null;
  const begun = ({ layer }: { layer: FilmLayer }) =>
    layer.topNm - layer.gradedNm / 2 <= depthNm + 1e-6 * (1 + depthNm);
  return occurrences.findLast(begun) ?? occurrences[0] ?? null;
}

export function modulus([re, im]: Complex): number {
  return Math.hypot(re, im);
}

/** How much of the total a share makes up: its part along the total, 1 for all of it, negative where it works against. */
export function partOfTotal([re, im]: Complex, total: Complex): number {
  const size = total[0] ** 2 + total[1] ** 2;
  return size > 0 ? (re * total[0] + im * total[1]) / size : NaN;
}
