import type { IndexDispersion, VoigtDispersion } from '../../shared/dispersion.ts';

export type RangeNm = [fromNm: number, toNm: number];

/** Wavelengths that differ by less than this fraction are the same: nm, um and eV round differently. */
const sameWithin = 1e-9;

export function isSameWavelength(aNm: number, bNm: number): boolean {
  return Math.abs(aNm - bNm) <= sameWithin * bNm;
}

/** Wavelengths for which a dispersion is known, nm; equal ends for a constant known at one wavelength. */
export function dispersionRangeNm(dispersion: IndexDispersion | VoigtDispersion): RangeNm {
  if (dispersion.kind === 'formula') return [dispersion.rangeNm[0], dispersion.rangeNm[1]];
  return [dispersion.wavelengthsNm[0]!, dispersion.wavelengthsNm[dispersion.wavelengthsNm.length - 1]!];
}

/** A wavelength was asked for which a material's constant is not known; nothing is ever extrapolated. */
export class DispersionRangeError extends Error {
  override readonly name = 'DispersionRangeError';

  /**
   * @param subject what is not known, such as "Cobalt (co-johnson-1974)"
   * @param rangeNm where it is known; equal ends for a constant known at one wavelength
   * @param wavelengthNm the first wavelength asked outside of that
   */
  constructor(
    readonly subject: string,
    readonly rangeNm: RangeNm,
    readonly wavelengthNm: number,
  ) {
    super(describe(subject, rangeNm, wavelengthNm));
  }
}

function describe(subject: string, [fromNm, toNm]: RangeNm, wavelengthNm: number): string {
  if (fromNm === toNm) {
    return `${subject} is known at ${nm(fromNm)} nm only; ${nm(wavelengthNm)} nm was asked: allow this constant at other wavelengths in the stack, or work at ${nm(fromNm)} nm`;
  }
  return `${subject} is known from ${nm(fromNm)} to ${nm(toNm)} nm; ${nm(wavelengthNm)} nm was asked: stay in this range or choose another source`;
}

/** Enough digits to tell wavelengths apart that are not the same, without the noise of 1e3 * 0.1993. */
function nm(value: number): string {
  return String(Number(value.toPrecision(10)));
}
