import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { LayerInput } from '../../shared/solve.ts';
import { formula } from './formula.ts';
import type { CoherentPoint } from './solvePoint.ts';
import { distance, size, solvePoint, solvePoints } from './solvePoint.ts';

// Where a careless solver overflows, divides by zero or loses its digits. Closed forms and scaling laws stand in for
// printed values; each test says which.

const COBALT: Complex = [2.25, 4.07];
const OBLIQUE: Vector = [0.48, 0.6, 0.64];

const cobalt = (factor: number, m: Vector = OBLIQUE): MediumInput => ({
  index: COBALT,
  voigt: [0.03 * factor, 0.01 * factor],
  m,
});

function expectFinite(point: CoherentPoint): void {
  const { r, t, R, T, A } = point;
  for (const jones of t ? [r, t] : [r]) {
    for (const value of Object.values(jones).flat()) expect(Number.isFinite(value)).toBe(true);
  }
  for (const pair of [R, T, A]) expect([pair.p, pair.s].every(Number.isFinite)).toBe(true);
}

function stack(
  layers: LayerInput[],
  angleDeg = 45,
  substrate: MediumInput = { index: [3.88, 0.02] },
): CoherentPoint {
  return solvePoint({ wavelengthNm: 633, angleDeg, incident: { index: 1 }, layers, substrate });
}

describe('thick metals', () => {
  test.each([1e3, 1e6, 1e12])(
    '%d nm of cobalt reflects as a half space and lets nothing through',
    (thicknessNm) => {
      const thick = stack([{ thicknessNm, ...cobalt(1) }]);
      const bulk = stack([], 45, cobalt(1));
      expectFinite(thick);
      for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
        expect(distance(thick.r[element], bulk.r[element])).toBeLessThan(1e-14);
      }
      expect(Math.abs(thick.T.p) + Math.abs(thick.T.s)).toBeLessThan(1e-30);
      expect(bulk.t).toBeNull();
    },
  );

  test('a magnet below 1 mm of metal gives no signal rather than noise', () => {
    const { r } = stack([
      { thicknessNm: 1e6, index: [0.18, 3.43] },
      { thicknessNm: 10, ...cobalt(1) },
    ]);
    expect(size(r.sp) + size(r.ps)).toBeLessThan(1e-300);
  });
});

describe('Q from 0 through 1e-15 to 1', () => {
  const signal = (factor: number, m: Vector = OBLIQUE, angleDeg = 45) =>
    stack(
      [
        { thicknessNm: 8, index: [2.33, 4.14] },
        { thicknessNm: 5, ...cobalt(factor, m) },
      ],
      angleDeg,
    ).r;

  test('no Q, no signal', () => {
    expect([signal(0).sp, signal(0).ps]).toEqual([
      [0, 0],
      [0, 0],
    ]);
  });

  test.each<[string, Vector, number]>([
    ['polar', [0, 0, 1], 0],
    ['polar', [0, 0, 1], 70],
    ['longitudinal', [1, 0, 0], 70],
    ['oblique', OBLIQUE, 45],
    ['oblique', OBLIQUE, 89.9999],
  ])('%s %j at %f deg is linear in Q from 1e-15 to 1e-6', (_name, m, angleDeg) => {
    const scaled = (factor: number, element: 'sp' | 'ps') =>
      formula('a / f', { a: signal(factor, m, angleDeg)[element], f: factor });
    for (const element of ['sp', 'ps'] as const) {
      // The odd part only: what is quadratic in Q is 1e-8 here, so the reference is the mean of +Q and -Q.
      const reference = formula('(a + b) / 2', { a: scaled(1e-8, element), b: scaled(-1e-8, element) });
      for (const factor of [1e-15, 1e-12, 1e-9]) {
        expect(distance(scaled(factor, element), reference)).toBeLessThan(2e-9 * size(reference));
      }
    }
  });
});

describe('angles', () => {
  test('theta = 0 is the limit of small angles and has r_pp = -r_ss', () => {
    const layers = [{ thicknessNm: 12, ...cobalt(1, [0, 0, 1]) }];
    const [zero, near] = [stack(layers, 0), stack(layers, 1e-7)];
    expect(distance(zero.r.pp, [-zero.r.ss[0], -zero.r.ss[1]])).toBeLessThan(1e-15);
    for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
      expect(distance(zero.r[element], near.r[element])).toBeLessThan(1e-14);
    }
  });

  test.each([89.9999, 89.9999999, 89.9999999999])(
    '%d deg: r to -1, signal to 0 like the cosine',
    (angleDeg) => {
      const point = stack([{ thicknessNm: 12, ...cobalt(1) }], angleDeg);
      expectFinite(point);
      const cosine = Math.sin(((90 - angleDeg) * Math.PI) / 180);
      expect(distance(point.r.pp, [-1, 0])).toBeLessThan(20 * cosine + 1e-15);
      expect(distance(point.r.ss, [-1, 0])).toBeLessThan(20 * cosine + 1e-15);
      const reference = stack([{ thicknessNm: 12, ...cobalt(1) }], 89.999);
      const slope = size(reference.r.sp) / Math.sin((0.001 * Math.PI) / 180);
      expect(size(point.r.sp) / cosine / slope).toBeCloseTo(1, 3);
      const along = stack([{ thicknessNm: 12, ...cobalt(1, [1, 0, 0]) }], angleDeg).r;
      expect(distance(along.sp, [-along.ps[0], -along.ps[1]])).toBeLessThan(1e-9 * size(along.sp));
    },
  );

  test('at and around the critical angle of the exit medium', () => {
    const critical = (Math.asin(1 / 1.515) * 180) / Math.PI;
    const offsets = [-1e-5, -1e-7, -1e-9, 0, 1e-9, 1e-7, 1e-5];
    const points = solvePoints({
      wavelengthNm: 633,
      angleDeg: offsets.map((offset) => critical + offset),
      incident: { index: 1.515 },
      layers: [{ thicknessNm: 300, index: 2.2, voigt: 1e-3, m: OBLIQUE }],
      substrate: { index: 1 },
    });
    points.forEach((point, i) => {
      expectFinite(point);
      const near = Math.abs(offsets[i] ?? 0) <= 1e-6;
      expect(Math.abs(point.R.p + point.T.p - 1)).toBeLessThan(near ? 1e-7 : 1e-12);
      expect(Math.abs(point.R.s + point.T.s - 1)).toBeLessThan(near ? 1e-7 : 1e-12);
    });
  });

  test('at the critical angle of a layer, isotropic or magnetic, and of a magnetic exit medium', () => {
    const angleDeg = (Math.asin(1.38 / 2.5) * 180) / Math.PI;
    for (const film of [{ index: 1.38 }, { index: 1.38, voigt: 1e-4, m: OBLIQUE }] satisfies MediumInput[]) {
      for (const substrate of [{ index: 3 }, film] satisfies MediumInput[]) {
        const point = solvePoint({
          wavelengthNm: 633,
          angleDeg,
          incident: { index: 2.5 },
          layers: [{ ...film, thicknessNm: 250 }],
          substrate,
        });
        expectFinite(point);
        expect(Math.abs(point.R.p + point.T.p - 1)).toBeLessThan(1e-7);
        expect(Math.abs(point.R.s + point.T.s - 1)).toBeLessThan(1e-7);
      }
    }
  });

  test('beyond it all light returns, exactly', () => {
    const { R, T } = solvePoint({
      wavelengthNm: 633,
      angleDeg: 60,
      incident: { index: 1.515 },
      layers: [{ thicknessNm: 300, index: 2.2, voigt: 1e-3, m: OBLIQUE }],
      substrate: { index: 1 },
    });
    expect([R.p, R.s]).toEqual([expect.closeTo(1, 13), expect.closeTo(1, 13)]);
    expect([T.p, T.s]).toEqual([expect.closeTo(0, 13), expect.closeTo(0, 13)]);
  });

  test('at a surface plasmon the signal is large, finite and reciprocal', () => {
    const at = (m: Vector) =>
      solvePoint({
        wavelengthNm: 633,
        angleDeg: 43.5,
        incident: { index: 1.515 },
        layers: [
          { thicknessNm: 40, index: [0.06, 4.2] },
          { thicknessNm: 3, ...cobalt(1, m) },
        ],
        substrate: { index: 1 },
      });
    const [up, turned] = [at(OBLIQUE), at([0.48, 0.6, -0.64])];
    expectFinite(up);
    expect(up.R.p).toBeLessThan(0.5);
    expect(distance(up.r.ps, [-turned.r.sp[0], -turned.r.sp[1]])).toBeLessThan(1e-12 * size(up.r.ps));
  });
});
