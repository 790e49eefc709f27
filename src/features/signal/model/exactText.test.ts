import { expect, it } from 'vitest';
import { exactJson, exactLatex, latexNumber } from './exactText.ts';
import { exactValues } from './exactValues.ts';
import type { ThreeStates } from './moreReadings.ts';

const angles = { p: { rotationDeg: 0.1 + 0.2, ellipticityDeg: -1e-7 }, s: null };
const still = { p: { rotationDeg: 0, ellipticityDeg: 0 }, s: null };
const point = {
  wavelengthNm: 632.8,
  angleDeg: 60,
  r: { pp: [0.5, -0.25], ps: [1e-4, 3e-5], sp: [3e-4, -1e-5], ss: [-0.75, 0] },
  t: null,
  R: { p: 1 / 3, s: 0.5625 },
  T: { p: 0, s: 0 },
  A: { p: 2 / 3, s: 0.4375 },
} satisfies Partial<ThreeStates['given']>;
const states: ThreeStates = {
  given: { ...point, kerr: angles },
  zero: { ...point, kerr: still },
  reversed: { ...point, kerr: angles },
};
const values = exactValues(states);

it('has the combinations of the cross elements, and no matrix where there is none', () => {
  // (3e-4 +- 1e-4)/2 and (-1e-5 +- 3e-5)/2 by hand.
  expect(values.amplitudes.map(({ name }) => name)).toEqual([
    ...['r_pp', 'r_ps', 'r_sp', 'r_ss'],
    ...['(r_sp + r_ps)/2', '(r_sp − r_ps)/2'],
  ]);
  expect(values.amplitudes[4]!.re).toBeCloseTo(2e-4, 18);
  expect(values.amplitudes[4]!.im).toBeCloseTo(1e-5, 18);
  expect(values.amplitudes[5]!.re).toBeCloseTo(1e-4, 18);
  expect(values.amplitudes[5]!.im).toBeCloseTo(-2e-5, 18);
  expect(values.amplitudes[3]).toMatchObject({ modulus: 0.75, phaseDeg: 180 });
});

it('reads back from JSON as the same doubles', () => {
  const read: unknown = JSON.parse(exactJson(values));
  expect(read).toMatchObject({
    amplitudes: { r_pp: { re: 0.5, im: -0.25 }, '(r_sp - r_ps)/2': { re: (3e-4 - 1e-4) / 2 } },
    numbers: {
      R_p: { value: 1 / 3, unit: '1' },
      'Kerr rotation, p light': { value: 0.1 + 0.2, unit: 'deg' },
      'Kerr rotation, s light': { value: null },
    },
  });
});

it('is set in LaTeX with all digits', () => {
  const text = exactLatex(values);
  expect(text).toContain('r_{pp} &= 0.5 - 0.25\\,\\mathrm{i} \\\\');
  expect(text).toContain('R_p &= 0.3333333333333333 \\\\');
  expect(text).toContain('\\phi_p &= 0.30000000000000004{}^{\\circ}');
  expect(text).toContain('\\chi_p &= -1 \\times 10^{-7}{}^{\\circ}');
  expect(text).toContain('\\phi_s &= \\text{none}');
  expect([latexNumber(1.5e21), latexNumber(0.1), latexNumber(-2.5e-9)]).toEqual([
    '1.5 \\times 10^{21}',
    '0.1',
    '-2.5 \\times 10^{-9}',
  ]);
});
