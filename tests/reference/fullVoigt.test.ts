import { describe, expect, test } from 'vitest';
import type { Vector } from '../../shared/complex.ts';
import { formula } from './formula.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// |Q| = 1, where a wave number or an impedance of the medium vanishes. The limits are closed forms.

describe('a Voigt constant of 1', () => {
  test('Q of 1 along each axis, finite and lossless in a dielectric', () => {
    for (const m of [
      [0, 0, 1],
      [1, 0, 0],
      [0, 1, 0],
      [0.6, 0, 0.8],
      [0, -0.6, 0.8],
    ] satisfies Vector[]) {
      for (const angleDeg of [0, 10, 60]) {
        const point = solvePoint({
          wavelengthNm: 600,
          angleDeg,
          incident: { index: 1 },
          layers: [{ thicknessNm: 10, index: 2, voigt: 1, m }],
          substrate: { index: 1.5 },
        });
        expect([point.r, point.t].flatMap((j) => Object.values(j ?? {}).flat()).every(Number.isFinite)).toBe(
          true,
        );
        expect(Math.abs(point.R.p + point.T.p - 1)).toBeLessThan(1e-7);
        expect(Math.abs(point.R.s + point.T.s - 1)).toBeLessThan(1e-7);
      }
    }
  });

  test('Q of 1 across the plane of incidence has the limit of Q just below 1', () => {
    const at = (voigt: number) =>
      solvePoint({
        wavelengthNm: 600,
        angleDeg: 10,
        incident: { index: 1 },
        layers: [{ thicknessNm: 10, index: 2, voigt, m: [0, 1, 0] }],
        substrate: { index: 1.5 },
      }).r;
    expect(distance(at(1).pp, at(1 - 1e-7).pp)).toBeLessThan(1e-6);
  });

  test('a polar Q of 1 at normal incidence is two circular waves of eps (1 + Q) and eps (1 - Q)', () => {
    // Circular waves do not mix: r_xx = (r+ + r-) / 2, with Airy's formula for each; kz = 0 for one of them.
    const film = (index: number) =>
      solvePoint({
        wavelengthNm: 600,
        angleDeg: 0,
        incident: { index: 1 },
        layers: [{ thicknessNm: 10, index }],
        substrate: { index: 1.5 },
      }).r.ss;
    const [fast, slow] = [film(Math.SQRT2 * 2), film(1e-9)];
    const { r } = solvePoint({
      wavelengthNm: 600,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [{ thicknessNm: 10, index: 2, voigt: 1, m: [0, 0, 1] }],
      substrate: { index: 1.5 },
    });
    expect(distance(r.ss, formula('(a + b) / 2', { a: fast, b: slow }))).toBeLessThan(1e-8);
    expect(size(r.sp)).toBeCloseTo(size(formula('(a - b) / 2', { a: fast, b: slow })), 8);
  });
});
