import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import {
  angle,
  between,
  incidentIndex,
  losslessMedium,
  passiveMedium,
  runs,
  thickness,
  wavelength,
} from './arbitraryStack.ts';
import { solvePoint } from './solvePoint.ts';

// Energy balance. Source: Poynting's theorem; a Hermitian tensor loses nothing (Landau and Lifshitz, Electrodynamics
// of Continuous Media, sec. 96).

const layersOf = <Medium extends object>(medium: fc.Arbitrary<Medium>) =>
  fc.array(
    fc.tuple(medium, thickness).map(([one, thicknessNm]) => ({ ...one, thicknessNm })),
    { maxLength: 4 },
  );

describe('R + T = 1 to 1e-12 without loss', () => {
  test('dielectrics, garnets, crystals and Hermitian tensors, on a dense substrate', () => {
    fc.assert(
      fc.property(
        wavelength,
        angle,
        incidentIndex,
        layersOf(losslessMedium),
        // Denser than every incident medium, so that nothing is near a critical angle of the substrate.
        fc.oneof(fc.record({ index: between(2.6, 4) }), fc.constant({ index: 3.5, voigt: 0.02, m: M })),
        (wavelengthNm, angleDeg, index, layers, substrate) => {
          const { R, T, A } = solvePoint({ wavelengthNm, angleDeg, incident: { index }, layers, substrate });
          for (const input of ['p', 's'] as const) {
            expect(Math.abs(R[input] + T[input] - 1)).toBeLessThan(1e-12);
            expect(Math.abs(A[input])).toBeLessThan(1e-12);
          }
        },
      ),
      runs(500),
    );
  });

  test('on any lossless substrate, its modes totally reflected or not', () => {
    fc.assert(
      fc.property(
        wavelength,
        angle,
        incidentIndex,
        layersOf(losslessMedium),
        losslessMedium,
        (wavelengthNm, angleDeg, index, layers, substrate) => {
          const { R, T } = solvePoint({ wavelengthNm, angleDeg, incident: { index }, layers, substrate });
          expect(Math.abs(R.p + T.p - 1)).toBeLessThan(1e-12);
          expect(Math.abs(R.s + T.s - 1)).toBeLessThan(1e-12);
          expect(Math.min(T.p, T.s)).toBeGreaterThan(-1e-12);
        },
      ),
      runs(500),
    );
  });
});

const M: [number, number, number] = [0.48, 0.6, 0.64];

describe('passive stacks absorb and never give', () => {
  test('A >= 0 and 0 <= R, T <= 1 on any passive substrate', () => {
    fc.assert(
      fc.property(
        wavelength,
        angle,
        incidentIndex,
        layersOf(passiveMedium),
        passiveMedium,
        (wavelengthNm, angleDeg, index, layers, substrate) => {
          const { R, T, A } = solvePoint({ wavelengthNm, angleDeg, incident: { index }, layers, substrate });
          for (const input of ['p', 's'] as const) {
            expect(R[input]).toBeGreaterThanOrEqual(0);
            expect(R[input]).toBeLessThan(1 + 1e-12);
            expect(T[input]).toBeGreaterThan(-1e-12);
            expect(T[input]).toBeLessThan(1 + 1e-12);
            expect(A[input]).toBeGreaterThan(-1e-12);
          }
        },
      ),
      runs(400),
    );
  });

  test('T is the flux of t where the exit medium has a t: |t_p|^2 Re(n* c) and |t_s|^2 Re(n c) over n0 cos', () => {
    fc.assert(
      fc.property(
        wavelength,
        between(0, 80),
        layersOf(passiveMedium),
        fc.tuple(between(0.2, 4), between(0.05, 4)),
        (wavelengthNm, angleDeg, layers, index) => {
          const { t, T } = solvePoint({
            wavelengthNm,
            angleDeg,
            incident: { index: 1 },
            layers,
            substrate: { index },
          });
          expect(t).not.toBeNull();
          if (!t) return;
          const power = ([re, im]: Complex) => re * re + im * im;
          const theta = (angleDeg * Math.PI) / 180;
          const n2: Complex = [index[0] ** 2 - index[1] ** 2, 2 * index[0] * index[1]];
          const q2: Complex = [n2[0] - Math.sin(theta) ** 2, n2[1]];
          const modulus = Math.hypot(...q2);
          const q: Complex = [
            Math.sqrt(Math.max(0, (modulus + q2[0]) / 2)),
            Math.sqrt(Math.max(0, (modulus - q2[0]) / 2)),
          ];
          // Re(c n*) with c = q / n
          const p = (q[0] * n2[0] + q[1] * n2[1]) / power(index);
          for (const [input, parallel, crossed] of [
            ['p', t.pp, t.sp],
            ['s', t.ps, t.ss],
          ] as const) {
            const flux = (power(parallel) * p + power(crossed) * q[0]) / Math.cos(theta);
            expect(Math.abs(T[input] - flux)).toBeLessThan(1e-11 * flux + 1e-13);
          }
        },
      ),
      runs(150),
    );
  });
});
