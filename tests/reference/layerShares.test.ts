import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { PlainFilm } from './abeles.ts';
import { abelesFields } from './abeles.ts';
import { formula } from './formula.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// The signal to first order in Q is the integral over the fields of the stack without Q (perturbation theory; the
// conventions page, "Where the signal comes from"). Fields by Abeles, integrals by Gauss-Legendre quadrature.

type Film = PlainFilm & { voigt?: Complex; m?: Vector };
type Light = { n0: number; angleDeg: number; wavelengthNm: number };
type Signal = { sp: Complex; ps: Complex; pp: Complex };

// Abscissas and weights of the 8-point rule on [-1, 1] (Abramowitz and Stegun, table 25.4).
const GAUSS: readonly [number, number][] = [
  [0.1834346424956498, 0.362683783378362],
  [0.525532409916329, 0.3137066458778873],
  [0.7966664774136267, 0.2223810344533745],
  [0.9602898564975363, 0.1012285362903763],
];

function integrate(thicknessNm: number, value: (depthNm: number) => Complex): Complex {
  const pieces = Math.ceil(thicknessNm / 2);
  const half = thicknessNm / pieces / 2;
  let sum: Complex = [0, 0];
  for (let piece = 0; piece < pieces; piece++) {
    const centre = (2 * piece + 1) * half;
    for (const [x, weight] of GAUSS) {
      for (const depth of [centre - half * x, centre + half * x]) {
        const [re, im] = value(depth);
        sum = [sum[0] + weight * half * re, sum[1] + weight * half * im];
      }
    }
  }
  return sum;
}

const PREFACTOR = 'i * k / (2 * n0 * cos(t * pi / 180)) * i * q * n^2 * x';

function firstOrder(films: Film[], substrate: Complex, light: Light): Signal {
  const fields = abelesFields(films, substrate, light);
  const total: Signal = { sp: [0, 0], ps: [0, 0], pp: [0, 0] };
  films.forEach(({ thicknessNm, index, voigt, m }, at) => {
    if (!voigt || !m) return;
    const [mx, my, mz] = m;
    const share = (element: keyof Signal) =>
      formula(PREFACTOR, {
        k: (2 * Math.PI) / light.wavelengthNm,
        n0: light.n0,
        t: light.angleDeg,
        q: voigt,
        n: index,
        x: integrate(thicknessNm, (depth) => {
          const { exP, ezP, eyS } = fields(at, depth);
          return product(element, { a: exP, b: ezP, c: eyS, mx, my, mz });
        }),
      });
    for (const element of ['sp', 'ps', 'pp'] as const) {
      const [re, im] = share(element);
      total[element] = [total[element][0] + re, total[element][1] + im];
    }
  });
  return total;
}

type Integrand = { a: Complex; b: Complex; c: Complex; mx: number; my: number; mz: number };

/** Integrand of the shares without i Q eps_d: fields of unit p light (a = Ex, b = Ez) and s light (c = Ey). */
function product(element: keyof Signal, { a, b, c, mx, my, mz }: Integrand): Complex {
  const times = (x: Complex, y: Complex): Complex => [x[0] * y[0] - x[1] * y[1], x[0] * y[1] + x[1] * y[0]];
  if (element === 'pp') return times([2 * my, 0], times(a, b));
  const sign = element === 'sp' ? 1 : -1;
  const mixed: Complex = [-mz * a[0] + sign * mx * b[0], -mz * a[1] + sign * mx * b[1]];
  return times(c, mixed);
}

/** Central difference of full solves in Q: odd in Q, so the error is of third order. */
function difference(films: Film[], substrate: Complex, light: Light, step: number): Signal {
  const solved = (factor: number) =>
    solvePoint({
      wavelengthNm: light.wavelengthNm,
      angleDeg: light.angleDeg,
      incident: { index: light.n0 },
      layers: films.map(({ voigt, m, ...film }) =>
        voigt && m ? { ...film, voigt: [factor * voigt[0], factor * voigt[1]], m } : film,
      ),
      substrate: { index: substrate },
    }).r;
  const [up, down] = [solved(step), solved(-step)];
  const slope = (element: 'sp' | 'ps' | 'pp'): Complex => [
    (up[element][0] - down[element][0]) / (2 * step),
    (up[element][1] - down[element][1]) / (2 * step),
  ];
  return { sp: slope('sp'), ps: slope('ps'), pp: slope('pp') };
}

const iron: PlainFilm = { thicknessNm: 10, index: [2.87, 3.36] };
const OBLIQUE: Vector = [0.48, 0.6, 0.64];

const stacks: [string, Film[], Complex, Light][] = [
  [
    'Au / Fe / Cr / Fe / MgO',
    [
      { thicknessNm: 2, index: [0.18, 3.43] },
      { ...iron, voigt: [0.0376, 0.0066], m: OBLIQUE },
      { thicknessNm: 1, index: [3.14, 3.31] },
      { ...iron, voigt: [0.0376, 0.0066], m: [-0.48, 0.6, 0.64] },
    ],
    [1.735, 0],
    { n0: 1, angleDeg: 55, wavelengthNm: 633 },
  ],
  [
    'a dielectric cavity under a prism, beyond the critical angle of the exit medium',
    [
      { thicknessNm: 48, index: [0.06, 4.2] },
      { thicknessNm: 210, index: [2.2, 0], voigt: [1e-3, 2e-4], m: [0.6, 0.3, -0.7] },
    ],
    [1, 0],
    { n0: 1.515, angleDeg: 62, wavelengthNm: 850 },
  ],
  [
    'a strongly absorbing cap, 60 nm of silver',
    [
      { thicknessNm: 60, index: [0.06, 4.2] },
      { thicknessNm: 4, index: [2.25, 4.07], voigt: [0.03, 0.01], m: [0.2, 0.1, 0.9] },
    ],
    [3.88, 0.02],
    { n0: 1, angleDeg: 20, wavelengthNm: 633 },
  ],
];

describe('differences of full solves agree with the integrals', () => {
  test.each(stacks)('%s, to 1e-6', (_name, films, substrate, light) => {
    const expected = firstOrder(films, substrate, light);
    const found = difference(films, substrate, light, 1e-3);
    for (const element of ['sp', 'ps', 'pp'] as const) {
      expect(size(expected[element])).toBeGreaterThan(1e-9);
      expect(distance(found[element], expected[element])).toBeLessThan(1e-6 * size(expected[element]));
    }
  });

  test.each(stacks)('%s, conversion to 1e-9 for Q of 1e-13', (_name, films, substrate, light) => {
    const expected = firstOrder(films, substrate, light);
    const found = difference(films, substrate, light, 1e-11);
    for (const element of ['sp', 'ps'] as const) {
      expect(distance(found[element], expected[element])).toBeLessThan(1e-9 * size(expected[element]));
    }
  });
});

describe('a magnet buried under metal keeps its digits', () => {
  // |r_sp| falls by 80 dB per 100 nm; the integral is compared relative to itself.
  test.each([200, 300, 400])('%d nm of Pt on top', (capNm) => {
    const films: Film[] = [
      { thicknessNm: capNm, index: [2.33, 4.14] },
      { thicknessNm: 5, index: [2.25, 4.07], voigt: [0.03, 0.01], m: OBLIQUE },
    ];
    const light = { n0: 1, angleDeg: 40, wavelengthNm: 633 };
    const expected = firstOrder(films, [3.88, 0.02], light);
    const found = difference(films, [3.88, 0.02], light, 1e-6);
    expect(size(expected.sp)).toBeLessThan(10 ** (-capNm / 25));
    for (const element of ['sp', 'ps'] as const) {
      expect(distance(found[element], expected[element])).toBeLessThan(1e-9 * size(expected[element]));
    }
  });
});
