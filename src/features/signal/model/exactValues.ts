import { readingOf } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { SolvePoint } from '../../../../shared/solve.ts';
import type { ThreeStates } from './moreReadings.ts';

export type Complex = readonly [re: number, im: number];
/** A complex number as exact as it was computed; modulus, and phase in deg. */
export type ExactComplex = {
  name: string;
  latex: string;
  re: number;
  im: number;
  modulus: number;
  phaseDeg: number;
};
export type ExactNumber = { name: string; latex: string; unit: 'deg' | '1'; value: number | null };

export type ExactValues = {
  wavelengthNm: number;
  angleDeg: number;
  /** Elements of r and t, and the symmetric and antisymmetric combinations of the cross ones. */
  amplitudes: ExactComplex[];
  numbers: ExactNumber[];
};

const elements = ['pp', 'ps', 'sp', 'ss'] as const;

const angles: readonly (readonly [ReadingName, name: string, latex: string])[] = [
  ['rotationP', 'Kerr rotation, p light', '\\phi_p'],
  ['ellipticityP', 'Kerr ellipticity, p light', '\\chi_p'],
  ['rotationS', 'Kerr rotation, s light', '\\phi_s'],
  ['ellipticityS', 'Kerr ellipticity, s light', '\\chi_s'],
];

/** Everything at the working point with all digits; amplitudes are left out where there are none. */
export function exactValues({ given, zero, reversed }: ThreeStates): ExactValues {
  const { r, t, R, T, A } = given;
  return {
    wavelengthNm: given.wavelengthNm,
    angleDeg: given.angleDeg,
    amplitudes: [
      ...matrix('r', r),
      ...(r
        ? [
            complex('(r_sp + r_ps)/2', '(r_{sp} + r_{ps})/2', half(r.sp, r.ps, 1)),
            complex('(r_sp − r_ps)/2', '(r_{sp} - r_{ps})/2', half(r.sp, r.ps, -1)),
          ]
        : []),
      ...matrix('t', t),
    ],
    numbers: [
      ...powers('R', R),
      ...powers('T', T),
      ...powers('A', A),
      ...angles.map(([reading, name, latex]) => ({
        name,
        latex,
        unit: 'deg' as const,
        value: readingOf(reading, given, zero, reversed),
      })),
    ],
  };
}

function matrix(letter: 'r' | 't', jones: SolvePoint['r']): ExactComplex[] {
  if (!jones) return [];
  return elements.map((element) => complex(`${letter}_${element}`, `${letter}_{${element}}`, jones[element]));
}

function complex(name: string, latex: string, [re, im]: Complex): ExactComplex {
  return {
    name,
    latex,
    re,
    im,
    modulus: Math.hypot(re, im),
    phaseDeg: (Math.atan2(im, re) * 180) / Math.PI,
  };
}

function half(a: Complex, b: Complex, sign: 1 | -1): Complex {
  return [(a[0] + sign * b[0]) / 2, (a[1] + sign * b[1]) / 2];
}

function powers(letter: 'R' | 'T' | 'A', { p, s }: { p: number; s: number }): ExactNumber[] {
  return [
    { name: `${letter}_p`, latex: `${letter}_p`, unit: '1', value: p },
    { name: `${letter}_s`, latex: `${letter}_s`, unit: '1', value: s },
  ];
}
