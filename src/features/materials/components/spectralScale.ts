import { photonEnergyEv } from '../../../../shared/units.ts';

export const spectralUnits = ['nm', 'eV'] as const;
export type SpectralUnit = (typeof spectralUnits)[number];

export const spectralLabels: Record<SpectralUnit, string> = {
  nm: 'vacuum wavelength (nm)',
  eV: 'photon energy (eV)',
};

/** Samples over ascending wavelength, as they stand over an ascending axis in the unit asked for. */
export function onSpectralAxis(
  unit: SpectralUnit,
  wavelengthsNm: readonly number[],
  values: readonly number[],
) {
  if (unit === 'nm') return { x: [...wavelengthsNm], y: [...values] };
  return { x: wavelengthsNm.map(photonEnergyEv).reverse(), y: [...values].reverse() };
}
