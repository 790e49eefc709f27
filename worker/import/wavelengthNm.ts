import type { SpectralUnit } from '../../shared/materialImport.ts';
import { EV_NM } from '../../shared/units.ts';

/** Speed of light, nm THz (exact: 299792458 m/s). */
const LIGHT_NM_THZ = 299_792.458;

/** Vacuum wavelength in nm of a spectral value > 0. */
export function wavelengthNm(value: number, unit: SpectralUnit): number {
  switch (unit) {
    case 'nm':
      return value;
    case 'um':
      return shifted(value, 3);
    case 'A':
      return shifted(value, -1);
    case 'eV':
      return EV_NM / value;
    case 'cm-1':
      return 1e7 / value;
    case 'THz':
      return LIGHT_NM_THZ / value;
  }
}

/** How a spectral column became wavelengths, in a sentence. */
export function describeSpectral(unit: SpectralUnit): string {
  switch (unit) {
    case 'nm':
      return 'Wavelengths in nm were taken as they are.';
    case 'um':
      return 'Wavelengths in um were multiplied by 1000 to nm.';
    case 'A':
      return 'Wavelengths in A were divided by 10 to nm.';
    case 'eV':
      return `Photon energies in eV became vacuum wavelengths in nm as ${EV_NM} / E.`;
    case 'cm-1':
      return 'Wavenumbers in cm^-1 became vacuum wavelengths in nm as 10^7 / wavenumber.';
    case 'THz':
      return `Frequencies in THz became vacuum wavelengths in nm as ${LIGHT_NM_THZ} / frequency.`;
  }
}

/** The decimal point is moved in the written number, so that 0.6328 um is 632.8 nm to the last bit. */
function shifted(value: number, places: number): number {
  const [digits, exponent = '0'] = String(value).split('e');
  return Number(`${digits}e${Number(exponent) + places}`);
}
