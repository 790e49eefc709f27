import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, over, plus, scaled, squareRoot, times } from './complexNumber.ts';

export type Mixed = {
  permittivity: Complex;
  /** How much of each part's gyration the mixture has. */
  weights: [Complex, Complex];
};

/**
 * Bruggeman's mixture of spheres (physics.md section 6): the root of sum f_i (eps_i - eps) / (eps_i + 2 eps) = 0
 * with Im > 0, or the positive one where both media are real and positive.
 *
 * @param fraction volume fraction of the second part, 0..1
 */
export function bruggeman(first: Complex, second: Complex, fraction: number): Mixed {
  const f1 = 1 - fraction;
  const b = plus(scaled(first, 3 * f1 - 1), scaled(second, 3 * fraction - 1));
  const root = squareRoot(plus(times(b, b), scaled(times(first, second), 8)));
  const [one, other] = [scaled(plus(b, root), 0.25), scaled(minus(b, root), 0.25)];
  const permittivity = isPhysical(one, other) ? one : other;
  // The antisymmetric part of the host does not enter the depolarization of a sphere, so the gyration is
  // [sum f_i g_i / (eps_i + 2 eps)^2] / [sum f_i / (eps_i + 2 eps)^2].
  const weightOf = (part: Complex, share: number): Complex => {
    const denominator = plus(part, scaled(permittivity, 2));
    return over([share, 0], times(denominator, denominator));
  };
  const [w1, w2] = [weightOf(first, f1), weightOf(second, fraction)];
  const sum = plus(w1, w2);
  return { permittivity, weights: [over(w1, sum), over(w2, sum)] };
}

/** Im > 0; between two roots without loss the positive one. */
function isPhysical(one: Complex, other: Complex): boolean {
  const slack = 1e-12 * (modulus(one) + modulus(other));
  return Math.abs(one[1] - other[1]) > slack ? one[1] > other[1] : one[0] > other[0];
}

/**
 * Maxwell Garnett's mixture: spheres of the second part in the first, which is not magnetic. The gyration follows
 * as g = g_i d eps_eff / d eps_i (physics.md section 6).
 *
 * @param fraction volume fraction of the spheres, 0..1
 */
export function maxwellGarnett(host: Complex, inclusion: Complex, fraction: number): Mixed {
  const polarizability = over(minus(inclusion, host), plus(inclusion, scaled(host, 2)));
  const filled = scaled(polarizability, fraction);
  const below = minus([1, 0], filled);
  const permittivity = times(host, over(plus([1, 0], scaled(filled, 2)), below));
  // d eps / d beta = 3 f eps_h / (1 - f beta)^2 and d beta / d eps_i = 3 eps_h / (eps_i + 2 eps_h)^2
  const contact = plus(inclusion, scaled(host, 2));
  const slope = over(
    scaled(times(host, host), 9 * fraction),
    times(times(below, below), times(contact, contact)),
  );
  return { permittivity, weights: [[0, 0], slope] };
}
