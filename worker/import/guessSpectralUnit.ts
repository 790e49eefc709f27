import type { SpectralUnit } from '../../shared/materialImport.ts';

/**
 * The unit that a spectral column without one most likely has; the person sees it and can choose another. Values
 * near 1 are photon energies in eV when they lie within 0.4 to 10 and reach above 2.6, else wavelengths in um.
 */
export function guessSpectralUnit(column: Float64Array): SpectralUnit | null {
  const values = column.filter((value) => !Number.isNaN(value));
  if (values.length === 0) return null;
  const least = values.reduce((a, b) => Math.min(a, b));
  const greatest = values.reduce((a, b) => Math.max(a, b));
  if (least <= 0) return null;
  if (greatest <= 100) return least >= 0.4 && greatest > 2.6 && greatest <= 10 ? 'eV' : 'um';
  return 'nm';
}
