import type { Complex } from '../../shared/complex.ts';
import { over, times } from '../optics/complexNumber.ts';

/** Elementary functions of a complex number, principal values; a real argument gives what Math gives. */

export const exponential = ([x, y]: Complex): Complex => {
  const size = Math.exp(x);
  return y === 0 ? [size, 0] : [size * Math.cos(y), size * Math.sin(y)];
};

export const logarithm = ([x, y]: Complex): Complex => [Math.log(Math.hypot(x, y)), Math.atan2(y, x)];

export const sine = ([x, y]: Complex): Complex => [
  Math.sin(x) * Math.cosh(y),
  y === 0 ? 0 : Math.cos(x) * Math.sinh(y),
];

export const cosine = ([x, y]: Complex): Complex => [
  Math.cos(x) * Math.cosh(y),
  y === 0 ? 0 : -Math.sin(x) * Math.sinh(y),
];

/** By tan x and tanh y, which do not overflow where sine and cosine do. */
export function tangent([x, y]: Complex): Complex {
  if (y === 0) return [Math.tan(x), 0];
  const [t, h] = [Math.tan(x), Math.tanh(y)];
  return over([t, h], [1, -t * h]);
}

export function arcTangent([x, y]: Complex): Complex {
  if (y === 0) return [Math.atan(x), 0];
  return [
    (Math.atan2(x, 1 - y) + Math.atan2(x, 1 + y)) / 2,
    Math.log((x * x + (1 + y) ** 2) / (x * x + (1 - y) ** 2)) / 4,
  ];
}

export const hyperbolicSine = ([x, y]: Complex): Complex => [
  Math.sinh(x) * Math.cos(y),
  y === 0 ? 0 : Math.cosh(x) * Math.sin(y),
];

export const hyperbolicCosine = ([x, y]: Complex): Complex => [
  Math.cosh(x) * Math.cos(y),
  y === 0 ? 0 : Math.sinh(x) * Math.sin(y),
];

export function hyperbolicTangent([x, y]: Complex): Complex {
  if (y === 0) return [Math.tanh(x), 0];
  const [h, t] = [Math.tanh(x), Math.tan(y)];
  return over([h, t], [1, h * t]);
}

/** Above this an exponent goes through the logarithm; below, products keep more digits. */
const MOST_FACTORS = 64;

export function power(base: Complex, exponent: Complex): Complex {
  const [p, pIm] = exponent;
  if (pIm === 0 && base[1] === 0 && (base[0] >= 0 || Number.isInteger(p))) return [base[0] ** p, 0];
  if (pIm === 0 && Number.isInteger(p) && Math.abs(p) <= MOST_FACTORS) {
    const product = repeated(base, Math.abs(p));
    return p < 0 ? over([1, 0], product) : product;
  }
  if (base[0] === 0 && base[1] === 0) return p > 0 ? [0, 0] : [NaN, NaN];
  return exponential(times(exponent, logarithm(base)));
}

function repeated(base: Complex, count: number): Complex {
  let product: Complex = [1, 0];
  let square = base;
  for (let left = count; left > 0; left = Math.floor(left / 2)) {
    if (left % 2 === 1) product = times(product, square);
    square = times(square, square);
  }
  return product;
}
