import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, over, plus, scaled, squareRoot, times } from '../optics/complexNumber.ts';

/**
 * Polar Kerr effect of a bulk medium at normal incidence (physics.md section 2), exact in Q: with
 * rho(Q) = (N0 - N sqrt(1+Q)) / (N0 + N sqrt(1+Q)),
 *
 *     kappa = r_sp / r_pp = i (rho(Q) - rho(-Q)) / (rho(Q) + rho(-Q)).
 *
 * With a = sqrt(1+Q), b = sqrt(1-Q), s = ab this is the same as 2 i N0 N Q / ((a + b) (N^2 s - N0^2)), in which nothing
 * cancels for small Q.
 */

/** Steps after which Newton's method has converged or never will; it takes four or five. */
const MOST_STEPS = 30;
const CONVERGED = 1e-15;

/**
 * kappa of a rotation phi and an ellipticity chi, in radians, below 45 degrees:
 * (tan phi + i tan chi) / (1 - i tan phi tan chi).
 */
export function kerrRatio(rotation: number, ellipticity: number): Complex {
  const [t, u] = [Math.tan(rotation), Math.tan(ellipticity)];
  return over([t, u], [1, -t * u]);
}

/**
 * The Q that gives a ratio kappa, by Newton's method from the first-order Q = kappa (N^2 - N0^2) / (i N0 N).
 *
 * @returns null where no Q with |Q| < 1 was found
 */
export function voigtOfKerr(kappa: Complex, index: Complex, incidentIndex: number): Complex | null {
  const permittivity = times(index, index);
  const contrast = minus(permittivity, [incidentIndex * incidentIndex, 0]);
  const strength = times([0, incidentIndex], index);
  let q = over(times(kappa, contrast), strength);
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { value, slope } = ratioAndSlope(q, permittivity, incidentIndex, strength);
    const change = over(minus(value, kappa), slope);
    q = minus(q, change);
    if (!(modulus(q) < 1)) return null;
    if (modulus(change) <= CONVERGED * modulus(q)) return q;
    // The last digit may go to and fro for ever.
    if (step > 8 && modulus(change) <= 1e-13 * modulus(q)) return q;
  }
  return null;
}

/** kappa(Q) and its derivative; `strength` is i N0 N. */
function ratioAndSlope(
  q: Complex,
  permittivity: Complex,
  incidentIndex: number,
  strength: Complex,
): { value: Complex; slope: Complex } {
  const a = squareRoot(plus([1, 0], q));
  const b = squareRoot(minus([1, 0], q));
  const s = times(a, b);
  const sum = plus(a, b);
  const bracket = minus(times(permittivity, s), [incidentIndex * incidentIndex, 0]);
  const h = times(sum, bracket);
  const value = over(times(scaled(strength, 2), q), h);
  // dh/dQ = -Q / s (bracket / sum + eps sum), since ds/dQ = -Q / s and d(a + b)/dQ = -Q / (s sum).
  const dh = times(scaled(over(q, s), -1), plus(over(bracket, sum), times(permittivity, sum)));
  const slope = over(times(scaled(strength, 2), minus(h, times(q, dh))), times(h, h));
  return { value, slope };
}
