import { describe, expect, it } from 'vitest';
import { buildMaterial, invented } from '../materialFixtures.ts';
import { curveOf, extraordinaryCurveOf, tabulatedOf } from './spectralCurves.ts';

// Numbers chosen for the test; the arithmetic is n^2 - k^2, 2nk and iQN^2, worked by hand.
const material = buildMaterial({
  content: {
    index: { kind: 'table', wavelengthsNm: [500, 700], n: [2, 3], k: [1, 0] },
    indexSource: invented,
    voigt: {
      kind: 'table',
      wavelengthsNm: [600, 800],
      q: [
        [0.01, 0.02],
        [0.03, 0],
      ],
    },
    voigtSource: invented,
  },
  curves: {
    wavelengthsNm: [500, 600, 700],
    n: [2, 2.5, 3],
    k: [1, 0.5, 0],
    voigt: {
      wavelengthsNm: [600, 700, 800],
      q: [
        [0.01, 0.02],
        [0.02, 0.01],
        [0.03, 0],
      ],
      index: [[2, 1], [3, 0], null],
    },
    extraordinary: { wavelengthsNm: [500, 700], n: [1, 2], k: [0, 0] },
  },
});

describe('curveOf', () => {
  it('turns N into the permittivity', () => {
    expect(curveOf(material, 'N')?.values).toEqual([
      [2, 1],
      [2.5, 0.5],
      [3, 0],
    ]);
    expect(curveOf(material, 'eps')?.values).toEqual([
      [3, 4],
      [6, 2.5],
      [9, 0],
    ]);
  });

  it('gives eps_xy = iQN^2 where N is known, and a gap where it is not', () => {
    const values = curveOf(material, 'epsXy')?.values ?? [];
    // i (0.01 + 0.02i) (3 + 4i) = i (-0.05 + 0.10i) = -0.10 - 0.05i.
    expect(values[0]?.[0]).toBeCloseTo(-0.1, 12);
    expect(values[0]?.[1]).toBeCloseTo(-0.05, 12);
    // i (0.02 + 0.01i) 9 = -0.09 + 0.18i.
    expect(values[1]?.[0]).toBeCloseTo(-0.09, 12);
    expect(values[1]?.[1]).toBeCloseTo(0.18, 12);
    expect(values[2]).toEqual([NaN, NaN]);
  });

  it('has no Q where none is known, and no extraordinary Q', () => {
    const plain = buildMaterial({ curves: { ...material.curves, voigt: null } });
    expect(curveOf(plain, 'Q')).toBeNull();
    expect(extraordinaryCurveOf(material, 'epsXy')).toBeNull();
    expect(extraordinaryCurveOf(material, 'eps')?.values).toEqual([
      [1, 0],
      [4, 0],
    ]);
  });
});

describe('tabulatedOf', () => {
  it('marks what the table gives, not what lies between', () => {
    expect(tabulatedOf(material, 'eps')?.values).toEqual([
      [3, 4],
      [9, 0],
    ]);
    expect(tabulatedOf(material, 'Q')?.wavelengthsNm).toEqual([600, 800]);
  });

  it('marks nothing on a formula', () => {
    const formula = buildMaterial({
      content: {
        ...material.content,
        index: { kind: 'formula', expression: 'c1', coefficients: [1.5], rangeNm: [500, 700] },
      },
    });
    expect(tabulatedOf(formula, 'N')).toBeNull();
  });
});
