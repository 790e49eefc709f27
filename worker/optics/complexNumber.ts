import type { Complex } from '../../shared/complex.ts';

/** Complex scalars for what is computed once per medium and point. The stack recursion uses matrix2.ts. */

export const plus = (a: Complex, b: Complex): Complex => [a[0] + b[0], a[1] + b[1]];

export const minus = (a: Complex, b: Complex): Complex => [a[0] - b[0], a[1] - b[1]];

export const times = (a: Complex, b: Complex): Complex => [
  a[0] * b[0] - a[1] * b[1],
  a[0] * b[1] + a[1] * b[0],
];

export const scaled = (a: Complex, factor: number): Complex => [a[0] * factor, a[1] * factor];

/** a / b by Smith's method, which neither overflows nor underflows on the way (Smith, CACM 5, 435 (1962)). */
export function over(a: Complex, b: Complex): Complex {
  if (Math.abs(b[0]) >= Math.abs(b[1])) {
    const ratio = b[1] / b[0];
    const scale = b[0] + b[1] * ratio;
    return [(a[0] + a[1] * ratio) / scale, (a[1] - a[0] * ratio) / scale];
  }
  const ratio = b[0] / b[1];
  const scale = b[0] * ratio + b[1];
  return [(a[0] * ratio + a[1]) / scale, (a[1] * ratio - a[0]) / scale];
}

export const modulus = (a: Complex): number => Math.hypot(a[0], a[1]);

/** Principal square root: real part >= 0. */
export function squareRoot(a: Complex): Complex {
  const size = Math.hypot(a[0], a[1]);
  if (size === 0) return [0, 0];
  const larger = Math.sqrt((size + Math.abs(a[0])) / 2);
  const smaller = a[1] / (2 * larger);
  if (a[0] >= 0) return [larger, smaller];
  return a[1] >= 0 ? [Math.abs(smaller), larger] : [Math.abs(smaller), -larger];
}

/**
 * The square root that belongs to a forward wave: decaying where the medium is evanescent or absorbs, positive
 * where it is transparent. Both readings agree for a passive medium. The cut lies along the negative imaginary
 * axis, far from the values of passive media, so that rounding never flips the direction of a wave.
 */
export function forwardRoot(a: Complex): Complex {
  const root = squareRoot(a);
  return a[0] < 0 && a[1] < 0 ? [-root[0], -root[1]] : root;
}
