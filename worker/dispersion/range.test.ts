import { describe, expect, test } from 'vitest';
import type { MaterialContent } from '../../shared/material.ts';
import { buildContent, givenTensor } from './materialFixtures.ts';
import { materialCurves } from './materialCurves.ts';
import { indexRangeNm, isEmptyRange, quadraticRangeNm, voigtRangeNm } from './range.ts';
import { CURVE_POINTS, logarithmicGrid, TRIAL_POINTS } from './wavelengthGrid.ts';

const table = (wavelengthsNm: number[]) => ({
  kind: 'table' as const,
  wavelengthsNm,
  n: wavelengthsNm.map(() => 2),
  k: wavelengthsNm.map(() => 1),
});
const q = (wavelengthsNm: number[]) => ({
  kind: 'table' as const,
  wavelengthsNm,
  q: wavelengthsNm.map((): [number, number] => [0.02, 0.01]),
});
const lines = (of: 'voigt' | 'gyration') => ({
  kind: 'lines' as const,
  of,
  rangeNm: [100, 600] as [number, number],
  lines: [{ shape: 'paramagnetic' as const, amplitude: 0.1, centreEv: 2.5, dampingEv: 0.3 }],
});
const mixture = (second: number[], secondQ: number[] | null): MaterialContent['index'] => ({
  kind: 'mixture',
  model: 'bruggeman',
  fraction: 0.3,
  parts: [
    { material: 'a', version: 1, name: 'A', index: table([300, 700]), voigt: null },
    { material: 'b', version: 1, name: 'B', index: table(second), voigt: secondQ && q(secondQ) },
  ],
});
const uniaxial = (extraordinaryNm: number[]) =>
  buildContent({
    index: table([400, 800]),
    anisotropy: { kind: 'uniaxial', extraordinary: table(extraordinaryNm), axis: [0, 0, 1] },
  });

describe('where a material is known', () => {
  test('a uniaxial crystal: where both indices are', () => {
    expect(indexRangeNm(uniaxial([500, 900]))).toEqual([500, 800]);
    expect(isEmptyRange(indexRangeNm(uniaxial([900, 950])))).toBe(true);
  });

  test('a mixture: where both parts are, but for the rounding of a wavelength', () => {
    expect(indexRangeNm(buildContent({ index: mixture([400, 900], null) }))).toEqual([400, 700]);
    expect(indexRangeNm(buildContent({ index: mixture([500], null) }))).toEqual([500, 500]);
    const touching = indexRangeNm(buildContent({ index: mixture([700 * (1 + 1e-12), 900], null) }));
    expect(isEmptyRange(touching)).toBe(false);
  });

  test('Q of a mixture: where also its magnetic parts have one', () => {
    const content = { index: mixture([400, 900], [450, 650]), voigt: { kind: 'mixture' as const } };
    expect(voigtRangeNm(content)).toEqual([450, 650]);
  });

  test('Q of a gyration needs the index, Q of lines does not', () => {
    const index = table([400, 800]);
    expect(voigtRangeNm({ index, voigt: lines('gyration') })).toEqual([400, 600]);
    expect(voigtRangeNm({ index, voigt: lines('voigt') })).toEqual([100, 600]);
    expect(voigtRangeNm({ index, voigt: null })).toBeNull();
  });
});

test('the second order of a cubic crystal is known at one wavelength', () => {
  const zero: [number, number] = [0, 0];
  const anisotropy = {
    kind: 'cubic' as const,
    wavelengthNm: 633,
    g11: zero,
    g12: zero,
    g44: zero,
    azimuthDeg: 0,
  };
  expect(quadraticRangeNm(buildContent({ anisotropy }))).toEqual([633, 633]);
  expect(quadraticRangeNm(uniaxial([500, 900]))).toBeNull();
});

describe('curves', () => {
  test('show a formula only where it has been tried', () => {
    for (const rangeNm of [
      [190, 25_000],
      [300, 301],
      [0.1, 3e5],
    ] as const) {
      const tried = new Set(logarithmicGrid(rangeNm, TRIAL_POINTS));
      expect(tried.size).toBeGreaterThan(1_000);
      expect(logarithmicGrid(rangeNm, CURVE_POINTS).every((point) => tried.has(point))).toBe(true);
    }
  });

  test('of lines of Q name the index where it is known', () => {
    const curves = materialCurves(buildContent({ index: table([400, 800]), voigt: lines('voigt') }));
    const { wavelengthsNm, index } = curves.voigt!;
    expect(wavelengthsNm).toHaveLength(400);
    expect([wavelengthsNm[0], wavelengthsNm[399]]).toEqual([100, 600]);
    wavelengthsNm.forEach((wavelengthNm, i) => {
      expect(index[i]).toEqual(wavelengthNm >= 400 ? [2, 1] : null);
    });
  });

  test('of a mixture span what is known, index and Q apart', () => {
    const { wavelengthsNm, k, voigt } = materialCurves(
      buildContent({ index: mixture([400, 900], [450, 650]), voigt: { kind: 'mixture' } }),
    );
    expect([wavelengthsNm[0], wavelengthsNm.at(-1)]).toEqual([400, 700]);
    expect(k.every((value) => Math.abs(value - 1) < 1e-12)).toBe(true);
    expect([voigt!.wavelengthsNm[0], voigt!.wavelengthsNm.at(-1)]).toEqual([450, 650]);
    expect(voigt!.q).toHaveLength(400);
  });

  test('of a mixture known at one wavelength are one point', () => {
    expect(materialCurves(buildContent({ index: mixture([500], null) })).wavelengthsNm).toEqual([500]);
  });

  test('of a tensor show the root of its mean diagonal', () => {
    // (4 + 5 + 6 + 3i) / 3 = 5 + i, by hand.
    const { wavelengthsNm, n, k, voigt, extraordinary } = materialCurves(
      buildContent({ index: { kind: 'tensor', wavelengthsNm: [600], epsilon: [givenTensor] } }),
    );
    expect(wavelengthsNm).toEqual([600]);
    expect(n[0]! ** 2 - k[0]! ** 2).toBeCloseTo(5, 13);
    expect(2 * n[0]! * k[0]!).toBeCloseTo(1, 13);
    expect([voigt, extraordinary]).toEqual([null, null]);
  });

  test('of a uniaxial crystal show each index over its own range', () => {
    const curves = materialCurves(uniaxial([500, 900]));
    expect([curves.wavelengthsNm[0], curves.wavelengthsNm.at(-1)]).toEqual([400, 800]);
    const { extraordinary } = curves;
    expect([extraordinary!.wavelengthsNm[0], extraordinary!.wavelengthsNm.at(-1)]).toEqual([500, 900]);
    expect(extraordinary!.n.every((n) => n === 2)).toBe(true);
  });
});
