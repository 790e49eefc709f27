import { expect, it } from 'vitest';
import { rowsBeside, wavelengthNmOf } from './rowsBeside.ts';

// One wavelength in every unit. Sources: SI definition of c (299 792 458 m/s) and CODATA 2018 hc/e for eV.
it.each([
  [632.8, 'nm'],
  [0.6328, 'um'],
  [6328, 'A'],
  [1239.841984 / 632.8, 'eV'],
  [1e7 / 632.8, 'cm-1'],
  [299_792.458 / 632.8, 'THz'],
] as const)('%d %s is 632.8 nm', (value, unit) => {
  expect(wavelengthNmOf(value, unit)).toBeCloseTo(632.8, 9);
});

it('puts beside each row what it became, and nothing where the thinned preview skips it', () => {
  const rows = [
    { line: 4, cells: [0.5, 2] },
    { line: 5, cells: [0.6, 3] },
    { line: 6, cells: [null, 4] },
  ];
  const preview = {
    index: { wavelengthsNm: [500], n: [2], k: [0.1] },
    voigt: { wavelengthsNm: [600], q: [[0.01, -0.02] as [number, number]] },
  };
  expect(rowsBeside(rows, { column: 0, unit: 'um' }, preview)).toEqual([
    { line: 4, cells: [0.5, 2], wavelengthNm: 500, index: { n: 2, k: 0.1 }, q: null },
    { line: 5, cells: [0.6, 3], wavelengthNm: 600, index: null, q: [0.01, -0.02] },
  ]);
});
