import type { Material } from '../../../../shared/material.ts';
import { offDiagonalOf, permittivityOf } from './permittivity.ts';

/** What a plot of a material can show; every one of them is complex. */
export const spectralQuantities = ['N', 'eps', 'Q', 'epsXy'] as const;
export type SpectralQuantity = (typeof spectralQuantities)[number];

export const quantityTexts: Record<SpectralQuantity, { label: string; parts: [string, string] }> = {
  N: { label: 'n and k', parts: ['n', 'k'] },
  eps: { label: 'ε₁ and ε₂', parts: ['ε₁', 'ε₂'] },
  Q: { label: 'Q', parts: ['Re Q', 'Im Q'] },
  epsXy: { label: 'ε_xy = iQN²', parts: ['Re ε_xy', 'Im ε_xy'] },
};

type Pair = readonly [number, number];

/** A complex quantity against ascending wavelength; NaN where it is not known. */
export type SpectralCurve = { wavelengthsNm: readonly number[]; values: readonly Pair[] };

/** Tables with more rows than this are drawn without marks: they would hide the curve that joins them. */
const MOST_MARKS = 600;
const NOWHERE: Pair = [NaN, NaN];

type Constants = Pick<Material, 'content' | 'curves'>;

export function isMagnetoOptic(quantity: SpectralQuantity): boolean {
  return quantity === 'Q' || quantity === 'epsXy';
}

/** The quantity as a solve interpolates it; null where the material has none. */
export function curveOf({ curves }: Constants, quantity: SpectralQuantity): SpectralCurve | null {
  if (!isMagnetoOptic(quantity)) return indexCurve(curves, quantity);
  const { voigt } = curves;
  if (voigt === null) return null;
  if (quantity === 'Q') return { wavelengthsNm: voigt.wavelengthsNm, values: voigt.q };
  const values = voigt.q.map((q, position) => {
    const index = voigt.index[position] ?? null;
    return index === null ? NOWHERE : offDiagonalOf(q, index);
  });
  return { wavelengthsNm: voigt.wavelengthsNm, values };
}

/** The same of the extraordinary index; null for what is not uniaxial. */
export function extraordinaryCurveOf(
  { curves }: Constants,
  quantity: SpectralQuantity,
): SpectralCurve | null {
  if (isMagnetoOptic(quantity) || curves.extraordinary === null) return null;
  return indexCurve(curves.extraordinary, quantity);
}

type IndexSamples = { wavelengthsNm: number[]; n: number[]; k: number[] };

function indexCurve({ wavelengthsNm, n, k }: IndexSamples, quantity: SpectralQuantity): SpectralCurve {
  const values = n.map((value, position): Pair => {
    const index: Pair = [value, k[position] ?? NaN];
    return quantity === 'eps' ? permittivityOf(index) : index;
  });
  return { wavelengthsNm, values };
}

/** What the source itself gives, to be marked on the curve; null for a formula, and for a table too long for that. */
export function tabulatedOf(material: Constants, quantity: SpectralQuantity): SpectralCurve | null {
  const { index, voigt } = material.content;
  const table = isMagnetoOptic(quantity) ? voigt : index;
  if (table?.kind !== 'table' || table.wavelengthsNm.length > MOST_MARKS) return null;
  if (table === index) return indexCurve(table, quantity);
  const curve = curveOf(material, quantity);
  if (curve === null) return null;
  const tabulated = new Set(table.wavelengthsNm);
  const rows = curve.wavelengthsNm.flatMap((wavelength, position) =>
    tabulated.has(wavelength) ? [[wavelength, curve.values[position] ?? NOWHERE] as const] : [],
  );
  return { wavelengthsNm: rows.map(([wavelength]) => wavelength), values: rows.map(([, value]) => value) };
}
