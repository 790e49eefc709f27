import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, over, plus, scaled, times } from './complexNumber.ts';

/** u^4 + c3 u^3 + c2 u^2 + c1 u + c0 */
export type Quartic = { c3: Complex; c2: Complex; c1: Complex; c0: Complex };

/** The quadratic factor u^2 - sum u + product, by the sum and product of its two roots. */
export type RootPair = { sum: Complex; product: Complex };

const MAX_STEPS = 60;

/**
 * The four roots by simultaneous iteration (Aberth, Math. Comp. 27, 339 (1973)). Multiple roots come out with a
 * relative error of about 1e-8 each but with an accurate sum and product, which is all that refinePair needs.
 */
export function quarticRoots(quartic: Quartic): Complex[] {
  const { c3, c2, c1, c0 } = quartic;
  const radius = Math.max(
    modulus(c3),
    Math.sqrt(modulus(c2)),
    Math.cbrt(modulus(c1)),
    Math.sqrt(Math.sqrt(modulus(c0))),
    1e-150,
  );
  const centre = scaled(c3, -0.25);
  // Start angles without symmetry about either axis, so that no two roots are approached alike.
  const roots = [0.4, 1.9, 3.7, 5.1].map((angle) =>
    plus(centre, scaled([Math.cos(angle), Math.sin(angle)], radius)),
  );
  for (let step = 0; step < MAX_STEPS; step++) {
    let largest = 0;
    for (let i = 0; i < 4; i++) {
      const correction = aberthCorrection(quartic, roots, i);
      roots[i] = minus(roots[i]!, correction);
      largest = Math.max(largest, modulus(correction));
    }
    if (largest <= 4e-16 * radius) break;
  }
  return roots;
}

function aberthCorrection({ c3, c2, c1, c0 }: Quartic, roots: Complex[], i: number): Complex {
  const u = roots[i]!;
  const value = plus(times(plus(times(plus(times(plus(u, c3), u), c2), u), c1), u), c0);
  if (value[0] === 0 && value[1] === 0) return [0, 0];
  const slope = plus(times(plus(times(plus(scaled(u, 4), scaled(c3, 3)), u), scaled(c2, 2)), u), c1);
  let repulsion: Complex = [0, 0];
  for (let j = 0; j < 4; j++) {
    const gap = minus(u, roots[j]!);
    if (j !== i && (gap[0] !== 0 || gap[1] !== 0)) repulsion = plus(repulsion, over([1, 0], gap));
  }
  const denominator = minus(slope, times(value, repulsion));
  return denominator[0] === 0 && denominator[1] === 0 ? [0, 0] : over(value, denominator);
}

/**
 * Newton steps on sum and product of two of the roots (Bairstow's method). It stays well conditioned when the two
 * roots coincide, as they do in a medium that is almost isotropic; only a root shared with the other pair is hard.
 */
export function refinePair(quartic: Quartic, start: RootPair): RootPair {
  let { sum, product } = start;
  const { c3, c2, c1, c0 } = quartic;
  let best = Infinity;
  const reach = 0.3 * (modulus(start.sum) + Math.sqrt(modulus(start.product)));
  for (let step = 0; step < 12; step++) {
    // Division of the quartic by the factor: quotient u^2 + d1 u + d0, remainder r1 u + r0.
    const d1 = plus(c3, sum);
    const d0 = plus(minus(c2, product), times(sum, d1));
    const r1 = plus(minus(c1, times(product, d1)), times(sum, d0));
    const r0 = minus(c0, times(product, d0));
    // Quotient modulo the factor, e1 u + e0, gives the derivatives of the remainder.
    const e1 = plus(sum, d1);
    const e0 = minus(d0, product);
    const m11 = plus(times(e1, sum), e0);
    const m21 = scaled(times(e1, product), -1);
    const determinant = plus(scaled(times(m11, e0), -1), times(e1, m21));
    if (determinant[0] === 0 && determinant[1] === 0) break;
    const dSum = over(minus(times(r1, e0), times(e1, r0)), determinant);
    const dProduct = over(minus(times(m21, r1), times(m11, r0)), determinant);
    const change = modulus(dSum) + modulus(dProduct);
    if (!(change < best)) break;
    best = change;
    sum = plus(sum, dSum);
    product = plus(product, dProduct);
    if (change <= 1e-17 * (modulus(sum) + modulus(product))) break;
  }
  // Gone to another pair of roots: the start, good to half the digits, is the better answer.
  return modulus(minus(sum, start.sum)) > reach ? start : { sum, product };
}
