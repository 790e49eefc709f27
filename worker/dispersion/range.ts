import type { IndexDispersion, PlainVoigt } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';

/** Equal ends for a constant known at one wavelength; ends in the wrong order where nothing is known. */
export type RangeNm = [fromNm: number, toNm: number];

/** Wavelengths that differ by less than this fraction are the same: nm, um and eV round differently. */
const sameWithin = 1e-9;

export function isSameWavelength(aNm: number, bNm: number): boolean {
  return Math.abs(aNm - bNm) <= sameWithin * bNm;
}

/** Wavelengths for which a dispersion is known by itself, nm; those of a mixture are known for both parts. */
export function dispersionRangeNm(dispersion: IndexDispersion | PlainVoigt): RangeNm {
  switch (dispersion.kind) {
    case 'table':
    case 'tensor':
      return [dispersion.wavelengthsNm[0]!, dispersion.wavelengthsNm[dispersion.wavelengthsNm.length - 1]!];
    case 'mixture':
      return intersectionOf(dispersion.parts.map((part) => dispersionRangeNm(part.index)));
    case 'formula':
    case 'model':
    case 'lines':
      return [dispersion.rangeNm[0], dispersion.rangeNm[1]];
  }
}

/** Where the index of a material is known, nm; of a uniaxial crystal where both of its indices are. */
export function indexRangeNm({ index, anisotropy }: MaterialContent): RangeNm {
  const ordinary = dispersionRangeNm(index);
  return anisotropy?.kind === 'uniaxial'
    ? intersectionOf([ordinary, dispersionRangeNm(anisotropy.extraordinary)])
    : ordinary;
}

/** Where Q of a material is known, nm: Q that follows from a gyration or a mixture needs the index there too. */
export function voigtRangeNm({ index, voigt }: Pick<MaterialContent, 'index' | 'voigt'>): RangeNm | null {
  if (voigt === null) return null;
  if (voigt.kind !== 'mixture') {
    const own = dispersionRangeNm(voigt);
    const needsIndex = voigt.kind === 'lines' && voigt.of === 'gyration';
    return needsIndex ? intersectionOf([own, dispersionRangeNm(index)]) : own;
  }
  const parts = index.kind === 'mixture' ? index.parts : [];
  const magnetic = parts.map(voigtRangeNm).filter((range) => range !== null);
  return intersectionOf([dispersionRangeNm(index), ...magnetic]);
}

/** The one wavelength at which the second order in m of a cubic crystal is known. */
export function quadraticRangeNm({ anisotropy }: MaterialContent): RangeNm | null {
  return anisotropy?.kind === 'cubic' ? [anisotropy.wavelengthNm, anisotropy.wavelengthNm] : null;
}

/** Empty ranges, those with ends in the wrong order, stay empty. */
export function isEmptyRange([fromNm, toNm]: RangeNm): boolean {
  return fromNm > toNm;
}

function intersectionOf(ranges: RangeNm[]): RangeNm {
  const fromNm = Math.max(...ranges.map((range) => range[0]));
  const toNm = Math.min(...ranges.map((range) => range[1]));
  return isSameWavelength(fromNm, toNm) ? [fromNm, fromNm] : [fromNm, toNm];
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
