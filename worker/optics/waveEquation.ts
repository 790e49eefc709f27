import type { Complex } from '../../shared/complex.ts';
import { minus, over, plus, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import type { Medium } from './medium.ts';
import type { Quartic } from './quartic.ts';
import { element } from './tensor.ts';

/**
 * The 4x4 problem of physics.md section 3 (Berreman, J. Opt. Soc. Am. 62, 502 (1972)) in halves: the tangential field
 * f = (Hy, Ey) and its flux g = (Ex, -Hx), with k0 = 1,
 *
 *     f' = i (A f + B g),   A = [a11, a12; 0, 0],   B = diag(b11, 1),
 *     g' = i (C f + F g),   C = [c11, c12; c21, c22],   F = [f11, 0; f21, 0].
 *
 * Hy rather than Ex stands in f because Ex of a p wave vanishes at a critical angle, where a description by Ex
 * would break down.
 */
export type FieldSystem = {
  a11: Complex;
  a12: Complex;
  b11: Complex;
  c11: Complex;
  c12: Complex;
  c21: Complex;
  c22: Complex;
  f11: Complex;
  f21: Complex;
};

/** @param medium loaded at the wavelength */
export function fieldSystem(medium: Medium, geometry: Geometry): FieldSystem {
  const { xi } = geometry;
  const e = (row: number, column: number) => element(medium.tensor, row, column);
  const zz = e(2, 2);
  const [xzShare, yzShare] = [over(e(0, 2), zz), over(e(1, 2), zz)];
  const zzLessXi2 = medium.diagonalLessXi2(2, geometry);
  return {
    a11: scaled(xzShare, -xi),
    a12: minus(e(0, 1), times(xzShare, e(2, 1))),
    b11: minus(e(0, 0), times(xzShare, e(2, 0))),
    c11: over(zzLessXi2, zz),
    c12: scaled(over(e(2, 1), zz), -xi),
    c21: scaled(yzShare, -xi),
    c22: minus(medium.diagonalLessXi2(1, geometry), times(yzShare, e(2, 1))),
    f11: scaled(over(e(2, 0), zz), -xi),
    f21: minus(e(1, 0), times(yzShare, e(2, 0))),
  };
}

/** The same system with Hy and Ex in each other's place, for media in which b11 vanishes. */
export function exchanged(system: FieldSystem): FieldSystem {
  const { a11, a12, b11, c11, c12, c21, c22, f11, f21 } = system;
  return { a11: f11, a12: c12, b11: c11, c11: b11, c12: a12, c21: f21, c22, f11: a11, f21: c21 };
}

/**
 * Waves exp(i u z) of the system satisfy the 2x2 quadratic problem (u^2 - u U + V) f = 0 with U = A + B F B^-1 and
 * V = B F B^-1 A - B C; U22 = 0.
 */
export type WaveEquation = {
  u11: Complex;
  u12: Complex;
  u21: Complex;
  v12: Complex;
  v21: Complex;
  v22: Complex;
  /** V22 - V11. */
  vGap: Complex;
  /** g1 = (f1' / i - A1 f) / b11 */
  a11: Complex;
  a12: Complex;
  b11: Complex;
};

/** @param vGap V22 - V11 where it is known without cancellation */
export function waveEquation(system: FieldSystem, vGap?: Complex): WaveEquation {
  const { a11, a12, b11, c11, c12, c21, c22, f11, f21 } = system;
  const v22 = minus(over(times(f21, a12), b11), c22);
  return {
    u11: plus(a11, f11),
    u12: a12,
    u21: over(f21, b11),
    v12: minus(times(f11, a12), times(b11, c12)),
    v21: minus(over(times(f21, a11), b11), c21),
    v22,
    vGap: vGap ?? minus(v22, minus(times(f11, a11), times(b11, c11))),
    a11,
    a12,
    b11,
  };
}

/**
 * V22 - V11 of f = (Hy, Ey) as a sum of what makes the two polarizations different: gyration and birefringence. It is
 * exactly zero in an isotropic medium, and a splitting of 1e-15 keeps its digits.
 */
export function polarizationGap(medium: Medium, system: FieldSystem, geometry: Geometry): Complex {
  const e = (row: number, column: number) => element(medium.tensor, row, column);
  const [xx, zz] = [e(0, 0), e(2, 2)];
  const coupling = over(times(system.a12, system.f21), system.b11);
  const tilt = over(minus(times(e(1, 2), e(2, 1)), times(e(0, 2), e(2, 0))), zz);
  const birefringence = plus(minus(xx, e(1, 1)), scaled(over(minus(zz, xx), zz), geometry.xi ** 2));
  return plus(plus(coupling, tilt), birefringence);
}

/** det(u^2 - u U + V) as a quartic in u. */
export function secularQuartic(equation: WaveEquation): Quartic {
  const { u11, u12, u21, v12, v21, v22, vGap } = equation;
  const v11 = minus(v22, vGap);
  return {
    c3: scaled(u11, -1),
    c2: minus(plus(v11, v22), times(u12, u21)),
    c1: plus(minus(times(u12, v21), times(u11, v22)), times(u21, v12)),
    c0: minus(times(v11, v22), times(v12, v21)),
  };
}
