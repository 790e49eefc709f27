import type { Complex, Vector } from '../../shared/complex.ts';
import { minus, modulus, plus, times } from './complexNumber.ts';
import type { Rotation } from './rotation.ts';
import { rotated, rotatedVector, transposed } from './rotation.ts';

/** Element (row, column) of a tensor as a complex number; rows and columns count from 0. */
export function element(tensor: Tensor, row: number, column: number): Complex {
  const i = at(row, column);
  return [tensor[i]!, tensor[i + 1]!];
}

/**
 * A permittivity tensor: 18 doubles, rows x, y, z, each element re, im. Element (row, column) starts at
 * `2 * (3 * row + column)`.
 */
export type Tensor = Float64Array;

export function createTensor(): Tensor {
  return new Float64Array(18);
}

const at = (row: number, column: number) => 2 * (3 * row + column);

function addTo(tensor: Tensor, row: number, column: number, re: number, im: number): void {
  const i = at(row, column);
  tensor[i] = tensor[i]! + re;
  tensor[i + 1] = tensor[i + 1]! + im;
}

/** out = eps_d times the unit tensor. */
export function setScalar(out: Tensor, permittivity: Complex): void {
  out.fill(0);
  for (let i = 0; i < 3; i++) addTo(out, i, i, permittivity[0], permittivity[1]);
}

/**
 * Adds the first order in m (physics.md section 2): for m = +z, eps_xy = i Q eps_d and eps_yx = -i Q eps_d,
 * and cyclic in x, y, z.
 */
export function addGyration(out: Tensor, permittivity: Complex, voigt: Complex, m: Vector, factor = 1): void {
  const [re, im] = times(voigt, permittivity);
  for (let axis = 0; axis < 3; axis++) {
    const row = (axis + 1) % 3;
    const column = (axis + 2) % 3;
    const length = factor * m[axis]!;
    addTo(out, row, column, -im * length, re * length);
    addTo(out, column, row, im * length, -re * length);
  }
}

/**
 * Adds (eps_e - eps_o) n n^T for a uniaxial medium with optic axis n (any length but zero). The difference is taken
 * as (Ne - No)(Ne + No), so that a weak birefringence keeps its digits.
 *
 * @param ordinary No, extraordinary Ne: refractive indices
 */
export function addUniaxial(out: Tensor, ordinary: Complex, extraordinary: Complex, axis: Vector): void {
  const length = Math.hypot(axis[0], axis[1], axis[2]);
  const n = [axis[0] / length, axis[1] / length, axis[2] / length];
  const [re, im] = times(minus(extraordinary, ordinary), plus(extraordinary, ordinary));
  for (let row = 0; row < 3; row++) {
    for (let column = 0; column < 3; column++) {
      const weight = n[row]! * n[column]!;
      addTo(out, row, column, re * weight, im * weight);
    }
  }
}

export type QuadraticConstants = {
  g11: Complex;
  g12: Complex;
  g44: Complex;
  /** Columns are the crystal axes [100], [010], [001]. */
  crystal: Rotation;
};

/**
 * Adds the second order in m of a cubic crystal (physics.md section 2): m is taken into the crystal, the tensor
 * built there and turned back.
 */
export function addQuadratic(out: Tensor, constants: QuadraticConstants, m: Vector): void {
  const { g11, g12, g44, crystal } = constants;
  const inside = rotatedVector(m, transposed(crystal));
  const inCrystal = createTensor();
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 3; j++) {
      const product = inside[i]! * inside[j]!;
      if (i !== j) {
        addTo(inCrystal, i, j, 2 * g44[0] * product, 2 * g44[1] * product);
        continue;
      }
      const others = inside[(i + 1) % 3]! ** 2 + inside[(i + 2) % 3]! ** 2;
      addTo(inCrystal, i, i, g11[0] * product + g12[0] * others, g11[1] * product + g12[1] * others);
    }
  }
  const turned = rotated(inCrystal, crystal);
  for (let i = 0; i < 18; i++) out[i] = out[i]! + turned[i]!;
}

/** The part odd in m is the antisymmetric one (Onsager): eps = symmetric + factor times antisymmetric. */
export function scaleAntisymmetricPart(tensor: Tensor, factor: number): void {
  for (const [row, column] of [
    [0, 1],
    [0, 2],
    [1, 2],
  ] as const) {
    for (const part of [0, 1]) {
      const a = at(row, column) + part;
      const b = at(column, row) + part;
      const even = (tensor[a]! + tensor[b]!) / 2;
      const odd = (factor * (tensor[a]! - tensor[b]!)) / 2;
      tensor[a] = even + odd;
      tensor[b] = even - odd;
    }
  }
}

/** z -> -z: the elements that couple z with x and y change sign. Half a turn about z does the same. */
export function mirror(tensor: Tensor): void {
  for (const i of [2, 5, 6, 7]) {
    tensor[2 * i] = -tensor[2 * i]!;
    tensor[2 * i + 1] = -tensor[2 * i + 1]!;
  }
}

/** True when the tensor is exactly a multiple of the unit tensor. */
export function isMultipleOfIdentity(tensor: Tensor): boolean {
  for (let row = 0; row < 3; row++) {
    for (let column = 0; column < 3; column++) {
      const i = at(row, column);
      const re = row === column ? tensor[0] : 0;
      const im = row === column ? tensor[1] : 0;
      if (tensor[i] !== re || tensor[i + 1] !== im) return false;
    }
  }
  return true;
}

/** Element (i, j) of the loss matrix (eps - eps^H) / 2i, which is Hermitian. */
function loss(tensor: Tensor, i: number, j: number): Complex {
  const a = at(i, j);
  const b = at(j, i);
  return [(tensor[a + 1]! + tensor[b + 1]!) / 2, (tensor[b]! - tensor[a]!) / 2];
}

/**
 * True when (eps - eps^H)/2i has no negative eigenvalue beyond rounding, that is when the medium gives no energy.
 * A Hermitian 3x3 matrix is positive semidefinite when all its principal minors are >= 0 (Sylvester's criterion,
 * semidefinite form).
 */
export function isPassive(tensor: Tensor): boolean {
  let size = 0;
  for (const value of tensor) size = Math.max(size, Math.abs(value));
  const slack = 1e-12 * size;
  const [d0, d1, d2] = [0, 1, 2].map((i) => loss(tensor, i, i)[0]) as [number, number, number];
  if (Math.min(d0, d1, d2) < -slack) return false;
  const square = (i: number, j: number) => modulus(loss(tensor, i, j)) ** 2;
  const [l01, l02, l12] = [square(0, 1), square(0, 2), square(1, 2)];
  if (Math.min(d0 * d1 - l01, d0 * d2 - l02, d1 * d2 - l12) < -slack * size) return false;
  const cycle = times(times(loss(tensor, 0, 1), loss(tensor, 1, 2)), loss(tensor, 2, 0))[0];
  return d0 * d1 * d2 + 2 * cycle - d0 * l12 - d1 * l02 - d2 * l01 >= -slack * size * size;
}

/**
 * How much isotropic loss makes the medium passive: less the smallest eigenvalue of the loss matrix where that is
 * negative, else 0. Closed form for a Hermitian 3x3 matrix (Smith, Commun. ACM 4, 168 (1961)).
 */
export function gainOf(tensor: Tensor): number {
  if (isPassive(tensor)) return 0;
  const d = [0, 1, 2].map((i) => loss(tensor, i, i)[0]) as [number, number, number];
  const [l01, l12, l20] = [loss(tensor, 0, 1), loss(tensor, 1, 2), loss(tensor, 2, 0)];
  const mean = (d[0] + d[1] + d[2]) / 3;
  const [e0, e1, e2] = [d[0] - mean, d[1] - mean, d[2] - mean];
  const [s01, s12, s20] = [modulus(l01) ** 2, modulus(l12) ** 2, modulus(l20) ** 2];
  const spread = Math.sqrt((e0 * e0 + e1 * e1 + e2 * e2 + 2 * (s01 + s12 + s20)) / 6);
  const determinant = e0 * e1 * e2 + 2 * times(times(l01, l12), l20)[0] - e0 * s12 - e1 * s20 - e2 * s01;
  const half = Math.min(1, Math.max(-1, determinant / (2 * spread ** 3)));
  return -(mean + 2 * spread * Math.cos(Math.acos(half) / 3 + (2 * Math.PI) / 3));
}
