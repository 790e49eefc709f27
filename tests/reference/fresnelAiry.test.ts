import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import { formula } from './formula.ts';
import { distance, solvePoint } from './solvePoint.ts';

// A second evaluation by mathjs (a general-purpose library) of formulas printed in Born and Wolf, sections 1.5.2
// and 1.6.4, rewritten for exp(-iwt) and for our unit vectors, in which r_pp = -r_ss at normal incidence.

const ANGLES = [0, 12.5, 45, 63.7, 85, 89.9];

/** Normal wave number of a layer; the root that decays, or travels along +z. */
function normalWaveNumber(index: Complex, xi: number): Complex {
  const q = formula('sqrt(n^2 - x^2)', { n: index, x: xi });
  return q[1] < 0 || (q[1] === 0 && q[0] < 0) ? [-q[0], -q[1]] : q;
}

const FRESNEL = {
  rss: '(q1 - q2) / (q1 + q2)',
  tss: '2 q1 / (q1 + q2)',
  // Of the tangential field: (n2^2 q1 - n1^2 q2) / ..., which with our p_r is r_pp of an unturned H.
  rpp: '(n2^2 * q1 - n1^2 * q2) / (n2^2 * q1 + n1^2 * q2)',
  tpp: '2 n1 * n2 * q1 / (n2^2 * q1 + n1^2 * q2)',
};

describe('Fresnel coefficients', () => {
  test.each<[number, Complex]>([
    [1, [1.52, 0]],
    [1, [2.87, 3.36]],
    [1.515, [1.33, 0]],
    [2.5, [0.06, 4.2]],
  ])('from %f into %j', (n0, index) => {
    for (const angleDeg of ANGLES) {
      const { r, t } = solvePoint({
        wavelengthNm: 500,
        angleDeg,
        incident: { index: n0 },
        layers: [],
        substrate: { index },
      });
      const theta = (angleDeg * Math.PI) / 180;
      const scope = {
        n1: n0,
        n2: index,
        q1: n0 * Math.cos(theta),
        q2: normalWaveNumber(index, n0 * Math.sin(theta)),
      };
      expect(distance(r.ss, formula(FRESNEL.rss, scope))).toBeLessThan(1e-12);
      expect(distance(r.pp, formula(FRESNEL.rpp, scope))).toBeLessThan(1e-12);
      expect(t).not.toBeNull();
      if (!t) return;
      expect(distance(t.ss, formula(FRESNEL.tss, scope))).toBeLessThan(1e-12);
      expect(distance(t.pp, formula(FRESNEL.tpp, scope))).toBeLessThan(1e-12);
    }
  });
});

describe("Airy's formula for one film", () => {
  const AIRY = { r: '(a + b * f) / (1 + a * b * f)', t: 'c * d * h / (1 + a * b * f)' };

  test.each<[number, Complex, number, Complex]>([
    [1, [1.38, 0], 250, [1.52, 0]],
    [1, [2.87, 3.36], 12, [3.88, 0.02]],
    [1.515, [0.06, 4.2], 48, [1, 0]],
    [1.52, [1.2, 0], 400, [1.52, 0]],
  ])('%f / %j of %f nm / %j', (n0, film, thicknessNm, substrate) => {
    const wavelengthNm = 587.6;
    for (const angleDeg of ANGLES) {
      const { r, t } = solvePoint({
        wavelengthNm,
        angleDeg,
        incident: { index: n0 },
        layers: [{ thicknessNm, index: film }],
        substrate: { index: substrate },
      });
      const theta = (angleDeg * Math.PI) / 180;
      const xi = n0 * Math.sin(theta);
      const q: [Complex, Complex, Complex] = [
        [n0 * Math.cos(theta), 0],
        normalWaveNumber(film, xi),
        normalWaveNumber(substrate, xi),
      ];
      const upper = { n1: n0, n2: film, q1: q[0], q2: q[1] };
      const lower = { n1: film, n2: substrate, q1: q[1], q2: q[2] };
      const phase = { q: q[1], x: (2 * Math.PI * thicknessNm) / wavelengthNm };
      for (const wave of ['pp', 'ss'] as const) {
        const scope = {
          a: formula(FRESNEL[`r${wave}`], upper),
          b: formula(FRESNEL[`r${wave}`], lower),
          c: formula(FRESNEL[`t${wave}`], upper),
          d: formula(FRESNEL[`t${wave}`], lower),
          f: formula('exp(2i * x * q)', phase),
          h: formula('exp(i * x * q)', phase),
        };
        expect(distance(r[wave], formula(AIRY.r, scope))).toBeLessThan(1e-12);
        expect(t && distance(t[wave], formula(AIRY.t, scope))).toBeLessThan(1e-12);
      }
    }
  });
});
