import { linearStokes, NO_BEAM } from '../../shared/stokes.ts';
import type { Jones } from './observables.ts';

/**
 * Mueller matrices of physics.md section 4: sixteen doubles, rows and columns S0..S3, not normalized. They act on
 * Stokes vectors S1 = |Ep|^2 - |Es|^2, S2 = 2 Re(Ep Es*), S3 = 2 Im(Ep* Es) of unit-amplitude beams.
 */
export type Mueller = Float64Array;

/** Intensity, then the three components of the polarization. */
export type Stokes = Float64Array;

export function createMueller(): Mueller {
  return new Float64Array(16);
}

/** The Mueller matrix U (j kron j*) U^-1 of a Jones matrix, written out (physics.md section 4). */
export function muellerOf(jones: Jones): Mueller {
  const pp = square(jones, 0);
  const ps = square(jones, 2);
  const sp = square(jones, 4);
  const ss = square(jones, 6);
  const [rePpPs, imPpPs] = overlap(jones, 0, 2);
  const [reSpSs, imSpSs] = overlap(jones, 4, 6);
  const [rePpSp, imPpSp] = overlap(jones, 0, 4);
  const [rePsSs, imPsSs] = overlap(jones, 2, 6);
  const [rePpSs, imPpSs] = overlap(jones, 0, 6);
  const [rePsSp, imPsSp] = overlap(jones, 2, 4);
  return Float64Array.of(
    (pp + ps + sp + ss) / 2,
    (pp - ps + sp - ss) / 2,
    rePpPs + reSpSs,
    imPpPs + imSpSs,
    (pp + ps - sp - ss) / 2,
    (pp - ps - sp + ss) / 2,
    rePpPs - reSpSs,
    imPpPs - imSpSs,
    rePpSp + rePsSs,
    rePpSp - rePsSs,
    rePpSs + rePsSp,
    imPpSs - imPsSp,
    -imPpSp - imPsSs,
    imPsSs - imPpSp,
    -imPpSs - imPsSp,
    rePpSs - rePsSp,
  );
}

function square(jones: Jones, at: number): number {
  return jones[at]! ** 2 + jones[at + 1]! ** 2;
}

/** a conj(b) */
function overlap(jones: Jones, a: number, b: number): [re: number, im: number] {
  return [
    jones[a]! * jones[b]! + jones[a + 1]! * jones[b + 1]!,
    jones[a + 1]! * jones[b]! - jones[a]! * jones[b + 1]!,
  ];
}

/** out = x y; out must be neither. */
export function multiplyMueller(x: Mueller, y: Mueller): Mueller {
  const out = createMueller();
  for (let row = 0; row < 4; row++) {
    for (let column = 0; column < 4; column++) {
      let sum = 0;
      for (let i = 0; i < 4; i++) sum += x[4 * row + i]! * y[4 * i + column]!;
      out[4 * row + column] = sum;
    }
  }
  return out;
}

/** (1 - x)^-1 y by elimination with pivoting; the series of all round trips inside a slab. */
export function solveRoundTrips(x: Mueller, y: Mueller): Mueller {
  const a = createMueller();
  for (let i = 0; i < 16; i++) a[i] = (i % 5 === 0 ? 1 : 0) - x[i]!;
  const b = Float64Array.from(y);
  for (let column = 0; column < 4; column++) {
    let pivot = column;
    for (let row = column + 1; row < 4; row++) {
      if (Math.abs(a[4 * row + column]!) > Math.abs(a[4 * pivot + column]!)) pivot = row;
    }
    for (let i = 0; i < 4; i++) {
      swap(a, 4 * column + i, 4 * pivot + i);
      swap(b, 4 * column + i, 4 * pivot + i);
    }
    for (let row = 0; row < 4; row++) {
      if (row === column) continue;
      const factor = a[4 * row + column]! / a[4 * column + column]!;
      for (let i = 0; i < 4; i++) {
        a[4 * row + i] = a[4 * row + i]! - factor * a[4 * column + i]!;
        b[4 * row + i] = b[4 * row + i]! - factor * b[4 * column + i]!;
      }
    }
  }
  for (let row = 0; row < 4; row++) {
    for (let i = 0; i < 4; i++) b[4 * row + i] = b[4 * row + i]! / a[5 * row]!;
  }
  return b;
}

function swap(values: Float64Array, i: number, j: number): void {
  const kept = values[i]!;
  values[i] = values[j]!;
  values[j] = kept;
}

/**
 * The beam that leaves for linear input.
 *
 * @param azimuthDeg of the incident light, from p (0) toward s (90), deg
 */
export function stokesForAzimuth(mueller: Mueller, azimuthDeg: number): Stokes {
  const [s1, s2] = linearStokes(azimuthDeg);
  return applyMueller(mueller, s1, s2, 0);
}

/** M (1, s1, s2, s3) */
function applyMueller(mueller: Mueller, s1: number, s2: number, s3: number): Stokes {
  const out = new Float64Array(4);
  for (let row = 0; row < 4; row++) {
    const i = 4 * row;
    out[row] = mueller[i]! + mueller[i + 1]! * s1 + mueller[i + 2]! * s2 + mueller[i + 3]! * s3;
  }
  return out;
}

/** Polarized share of the intensity, 0..1; 0 for no beam. */
export function degreeOfPolarization(stokes: Stokes): number {
  const [s0, s1, s2, s3] = [stokes[0]!, stokes[1]!, stokes[2]!, stokes[3]!];
  return s0 < NO_BEAM ? 0 : Math.min(1, Math.hypot(s1, s2, s3) / s0);
}
