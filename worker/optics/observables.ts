import type { Matrix2 } from './matrix2.ts';

/** Jones matrix `[pp, ps; sp, ss]`: amplitude of the first for a unit incident wave of the second. */
export type Jones = Matrix2;

export type KerrAngles = { rotationDeg: number; ellipticityDeg: number };

export type Polarized = { p: number; s: number };

/** A beam weaker than this has no polarization worth the name (physics.md section 4). */
const NO_BEAM = 1e-28;

const HALF_IN_DEGREES = 90 / Math.PI;

/** Reflectance for p and s light, dimensionless. */
export function reflectance(r: Jones): Polarized {
  return {
    p: square(r[0]!, r[1]!) + square(r[4]!, r[5]!),
    s: square(r[2]!, r[3]!) + square(r[6]!, r[7]!),
  };
}

function square(re: number, im: number): number {
  return re * re + im * im;
}

/**
 * Polarization of the beam that leaves for linear p or s input (physics.md section 4): azimuth less the input's,
 * folded into (-90, 90] deg, and ellipticity angle, deg; both positive counter-clockwise for an observer who looks
 * into the arriving beam. Null for a beam with S0 < 1e-28.
 */
export function kerrAngles(jones: Jones, input: 'p' | 's'): KerrAngles | null {
  const column = input === 'p' ? 0 : 2;
  const pRe = jones[column]!;
  const pIm = jones[column + 1]!;
  const sRe = jones[column + 4]!;
  const sIm = jones[column + 5]!;
  const powerP = square(pRe, pIm);
  const powerS = square(sRe, sIm);
  if (powerP + powerS < NO_BEAM) return null;
  // S1 = |Ep|^2 - |Es|^2 as a product, and turned by 90 deg for s input: tiny angles keep their digits.
  const s1 = powerP - powerS;
  const s2 = 2 * (pRe * sRe + pIm * sIm);
  const s3 = 2 * (pRe * sIm - pIm * sRe);
  const sense = input === 'p' ? 1 : -1;
  const rotationDeg = HALF_IN_DEGREES * Math.atan2(sense * s2, sense * s1);
  return {
    rotationDeg: rotationDeg <= -90 ? rotationDeg + 180 : rotationDeg,
    ellipticityDeg: HALF_IN_DEGREES * Math.atan2(s3, Math.hypot(s1, s2)),
  };
}
