import { photonEnergyEv } from '../../../../shared/units.ts';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';

export const spectralUnits = ['nm', 'eV'] as const;
export type SpectralUnit = (typeof spectralUnits)[number];

const read = (value: number, unit: SpectralUnit) => `${Number(value.toPrecision(6))} ${unit}`;

export const spectralAxis: Record<SpectralUnit, PlotAxis> = {
  nm: {
    label: 'vacuum wavelength (nm)',
    format: (value) => `${read(value, 'nm')}, ${read(photonEnergyEv(value), 'eV')}`,
  },
  eV: {
    label: 'photon energy (eV)',
    format: (value) => `${read(value, 'eV')}, ${read(photonEnergyEv(value), 'nm')}`,
  },
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
