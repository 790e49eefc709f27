import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, over, plus, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import type { Medium } from './medium.ts';
import type { Quartic } from './quartic.ts';
import { element } from './tensor.ts';

/**
 * The 4x4 problem of physics.md section 3 (Berreman, J. Opt. Soc. Am. 62, 502 (1972)), halved.
 *
 * The tangential field is taken as f = (Hy, Ey) with the flux g = (Ex, -Hx). With k0 = 1 they obey
 * f' = i (A f + B g), g' = i (C f + F g), B diagonal. Waves exp(i u z) then satisfy the 2x2 quadratic problem
 *
 *     (u^2 - u U + V) f = 0,    U = A + B F B^-1,    V = B F B^-1 A - B C.
 *
 * Hy rather than Ex stands in f because Ex of a p wave vanishes at a critical angle, where a description by Ex
 * would break down.
 */
export type WaveEquation = {
  u11: Complex;
  u12: Complex;
  u21: Complex;
  v12: Complex;
  v21: Complex;
  v22: Complex;
  /** V22 - V11 without the cancellation of the two. */
  vGap: Complex;
  /** Row 1 of A, and B = diag(kappa, 1): g1 = (f1' / i - A1 f) / kappa. */
  a11: Complex;
  a12: Complex;
  kappa: Complex;
};

/** @param medium loaded at the wavelength */
export function waveEquation(medium: Medium, geometry: Geometry): WaveEquation {
  const { xi } = geometry;
  const e = (row: number, column: number) => element(medium.tensor, row, column);
  const [xx, xy, xz, yx, yy, yz, zx, zy, zz] = [
    e(0, 0),
    e(0, 1),
    e(0, 2),
    e(1, 0),
    e(1, 1),
    e(1, 2),
    e(2, 0),
    e(2, 1),
    e(2, 2),
  ];
  const yyLessXi2 = medium.yyLessXi2(geometry);
  const kappa = awayFromZero(minus(xx, over(times(xz, zx), zz)), modulus(xx));
  const eta1 = minus(xy, over(times(xz, zy), zz));
  const eta2 = minus(yx, over(times(yz, zx), zz));
  const xiXz = scaled(over(xz, zz), -xi);
  const xiZx = scaled(over(zx, zz), -xi);
  const xiZy = scaled(over(zy, zz), -xi);
  const xiYz = scaled(over(yz, zz), -xi);
  const eta1eta2 = over(times(eta1, eta2), kappa);
  const yzzy = over(times(yz, zy), zz);
  const xzzx = over(times(xz, zx), zz);
  // (eps_xx - eps_yy) + xi^2 (eps_zz - eps_xx) / eps_zz: exactly zero for a scalar diagonal.
  const birefringence = plus(minus(xx, yy), scaled(over(minus(zz, xx), zz), xi * xi));
  return {
    u11: plus(xiXz, xiZx),
    u12: eta1,
    u21: over(eta2, kappa),
    v12: minus(times(xiZx, eta1), times(kappa, xiZy)),
    v21: minus(over(times(xiXz, eta2), kappa), xiYz),
    v22: plus(minus(eta1eta2, yyLessXi2), yzzy),
    vGap: plus(plus(eta1eta2, minus(yzzy, xzzx)), birefringence),
    a11: xiXz,
    a12: eta1,
    kappa,
  };
}

/** kappa vanishes for |Q| = 1 across the plane of incidence, where the medium acts like one of permittivity 0. */
function awayFromZero(kappa: Complex, scale: number): Complex {
  const least = 1e-13 * scale;
  return modulus(kappa) < least ? [least, 0] : kappa;
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
