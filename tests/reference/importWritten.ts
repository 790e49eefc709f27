import type { Complex } from '../../shared/complex.ts';
import type { ImportMapping, SpectralUnit } from '../../shared/materialImport.ts';

/** The same physical data as other people may write it: the inverse of the import, from physics.md sections 2 and 7. */

export type Physical = { wavelengthNm: number; index: Complex; voigt: Complex };

export const times = (a: Complex, b: Complex): Complex => [
  a[0] * b[0] - a[1] * b[1],
  a[0] * b[1] + a[1] * b[0],
];
const conjugate = ([re, im]: Complex): Complex => [re, -im];

/** What is written for a wavelength; c = 299792458 m/s and hc/e = 1239.841984 eV nm (CODATA 2018). */
const spectral: Record<SpectralUnit, (nm: number) => number> = {
  nm: (nm) => nm,
  um: (nm) => nm / 1000,
  A: (nm) => nm * 10,
  eV: (nm) => 1239.841984 / nm,
  'cm-1': (nm) => 1e7 / nm,
  THz: (nm) => 299792.458 / nm,
};

export type Quantity = 'Q' | 'eps_xy' | 'S/m' | 's^-1';

/** Columns of a file: spectral, Re and Im of N or eps, Re and Im of the magneto-optic quantity. */
export function written(
  { wavelengthNm, index, voigt }: Physical,
  unit: SpectralUnit,
  quantity: Quantity,
  from: 'n, k' | 'eps1, eps2',
  { time, voigtSign }: Pick<ImportMapping['habits'], 'time' | 'voigtSign'>,
): number[] {
  const isOther = time === 'exp(+iwt)';
  const inTime = (value: Complex): Complex => (isOther ? conjugate(value) : value);
  const element = times([0, 1], times(voigt, times(index, index)));
  const entered = inTime(element);
  const permittivity = inTime(times(index, index));
  const first = from === 'n, k' ? inTime(index) : permittivity;
  return [spectral[unit](wavelengthNm), ...first, ...magnetoOptic()];

  function magnetoOptic(): Complex {
    // The definition of the source, solved for its Q: eps_xy = +-i Q eps_d.
    const norm = permittivity[0] ** 2 + permittivity[1] ** 2;
    const ratio = times(entered, [permittivity[0] / norm, -permittivity[1] / norm]);
    const sign = voigtSign === '+iQ' ? 1 : -1;
    if (quantity === 'Q') return times(ratio, [0, -sign]);
    if (quantity === 'eps_xy') return entered;
    // exp(-iwt): eps_xy = i sigma / (eps0 w), or 4 pi i sigma / w; exp(+iwt) has -i.
    const omega = (2 * Math.PI * 299792458) / (wavelengthNm * 1e-9);
    const factor = quantity === 'S/m' ? 8.8541878128e-12 * omega : omega / (4 * Math.PI);
    return times(entered, [0, isOther ? factor : -factor]);
  }
}

/** The mapping of such a file. */
export function mappingOf(
  unit: SpectralUnit,
  quantity: Quantity,
  from: 'n, k' | 'eps1, eps2',
  habits: ImportMapping['habits'],
): ImportMapping {
  const columns = { re: 3, im: 4 };
  return {
    spectral: { column: 0, unit },
    index: from === 'n, k' ? { from, n: 1, k: 2 } : { from, eps1: 1, eps2: 2 },
    voigt:
      quantity === 'Q' || quantity === 'eps_xy'
        ? { from: quantity, ...columns }
        : { from: 'sigma_xy', unit: quantity, ...columns },
    indexOf: null,
    habits,
  };
}
