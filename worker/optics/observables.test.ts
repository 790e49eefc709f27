import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { kerrAngles, reflectance } from './observables.ts';

// Definitions of the conventions page: S1 = |Ep|^2 - |Es|^2, S2 = 2 Re(Ep conj Es), S3 = 2 Im(conj(Ep) Es),
// azimuth 1/2 atan2(S2, S1), ellipticity 1/2 atan2(S3, sqrt(S1^2 + S2^2)).

const jones = (...values: number[]) => Float64Array.from(values);

/** A Jones matrix whose p column is (cos a, sin a) turned into an ellipse of ellipticity e, s column orthogonal. */
function ellipse(azimuthDeg: number, ellipticityDeg: number): [number, number, number, number] {
  const [a, e] = [(azimuthDeg * Math.PI) / 180, (ellipticityDeg * Math.PI) / 180];
  // (cos a cos e - i sin a sin e, sin a cos e + i cos a sin e)
  return [
    Math.cos(a) * Math.cos(e),
    -Math.sin(a) * Math.sin(e),
    Math.sin(a) * Math.cos(e),
    Math.cos(a) * Math.sin(e),
  ];
}

const angles = fc.tuple(
  fc.double({ min: -89.99, max: 89.99, noNaN: true }),
  fc.double({ min: -44.9, max: 44.9, noNaN: true }),
);

describe('Kerr angles', () => {
  test('are azimuth and ellipticity of the ellipse for p light', () => {
    fc.assert(
      fc.property(angles, ([azimuth, ellipticity]) => {
        const [pRe, pIm, sRe, sIm] = ellipse(azimuth, ellipticity);
        const found = kerrAngles(jones(pRe, pIm, 0, 0, sRe, sIm, 0, 0), 'p');
        expect(found?.ellipticityDeg).toBeCloseTo(ellipticity, 9);
        expect(found?.rotationDeg).toBeCloseTo(azimuth, 7);
      }),
      { numRuns: 200, seed: 7 },
    );
  });

  test('count from the s direction for s light', () => {
    fc.assert(
      fc.property(angles, ([turn, ellipticity]) => {
        const [pRe, pIm, sRe, sIm] = ellipse(90 + turn, ellipticity);
        const found = kerrAngles(jones(0, 0, pRe, pIm, 0, 0, sRe, sIm), 's');
        expect(found?.ellipticityDeg).toBeCloseTo(ellipticity, 9);
        expect(found?.rotationDeg).toBeCloseTo(turn, 7);
      }),
      { numRuns: 200, seed: 8 },
    );
  });

  test('do not depend on the phase and size of the beam', () => {
    const [pRe, pIm, sRe, sIm] = ellipse(12, -5);
    const [c, s] = [3e-9 * Math.cos(1.2), 3e-9 * Math.sin(1.2)];
    const turned = jones(
      pRe * c - pIm * s,
      pRe * s + pIm * c,
      0,
      0,
      sRe * c - sIm * s,
      sRe * s + sIm * c,
      0,
      0,
    );
    expect(kerrAngles(turned, 'p')).toEqual({
      rotationDeg: expect.closeTo(12, 9) as number,
      ellipticityDeg: expect.closeTo(-5, 9) as number,
    });
  });

  test('keep the digits of a tiny signal: Re and Im of r_sp / r_pp, and of -r_ps / r_ss', () => {
    const small = 1e-17;
    const r = jones(0.6, 0, 2 * small, small, 3 * small, -small, 0.5, 0);
    const perDegree = 180 / Math.PI;
    const [p, s] = [kerrAngles(r, 'p'), kerrAngles(r, 's')];
    expect(p!.rotationDeg / ((3 * small) / 0.6)).toBeCloseTo(perDegree, 9);
    expect(p!.ellipticityDeg / (-small / 0.6)).toBeCloseTo(perDegree, 9);
    expect(s!.rotationDeg / ((-2 * small) / 0.5)).toBeCloseTo(perDegree, 9);
    expect(s!.ellipticityDeg / (-small / 0.5)).toBeCloseTo(perDegree, 9);
  });

  test('fold into (-90, 90]', () => {
    expect(kerrAngles(jones(0, 0, 0, 0, 1, 0, 0, 0), 'p')?.rotationDeg).toBe(90);
    expect(kerrAngles(jones(0, 0, 1, 0, 0, 0, 0, 0), 's')?.rotationDeg).toBe(90);
    expect(kerrAngles(jones(-1, 0, 0, 0, -1, 0, 0, 0), 'p')?.rotationDeg).toBeCloseTo(45, 12);
  });

  test('are null below S0 = 1e-28 and not just above', () => {
    expect(kerrAngles(jones(0.99e-14, 0, 0, 0, 0, 0, 1, 0), 'p')).toBeNull();
    expect(kerrAngles(jones(0.99e-14, 0, 0, 0, 0, 0, 1, 0), 's')).not.toBeNull();
    expect(kerrAngles(jones(1.01e-14, 0, 0, 0, 0, 0, 1, 0), 'p')).toEqual({
      rotationDeg: 0,
      ellipticityDeg: 0,
    });
  });

  test('a circular beam has ellipticity 45 deg, positive for (1, i)', () => {
    expect(kerrAngles(jones(1, 0, 0, 0, 0, 1, 0, 0), 'p')?.ellipticityDeg).toBe(45);
    expect(kerrAngles(jones(1, 0, 0, 0, 0, -1, 0, 0), 'p')?.ellipticityDeg).toBe(-45);
  });
});

test('reflectance adds both polarizations of the beam', () => {
  const R = reflectance(jones(0.3, 0.4, 0.1, 0, 0, 0.5, 0.2, -0.2));
  expect(R.p).toBeCloseTo(0.25 + 0.25, 15);
  expect(R.s).toBeCloseTo(0.01 + 0.08, 15);
});
