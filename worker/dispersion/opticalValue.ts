import type { Complex } from '../../shared/complex.ts';
import { squareRoot } from '../optics/complexNumber.ts';

/** A formula or model has no usable value at some wavelength. */
export class DispersionValueError extends Error {
  override readonly name: string = 'DispersionValueError';
}

/** Complex arithmetic may leave a lossless value with a loss this far below 0, as a fraction of its modulus. */
const ROUNDING = 1e-12;

/** The solve contract's bounds of a constant (shared/medium.ts). */
const LARGEST = 1e20;

/**
 * N of a passive medium as it stands, but for rounding.
 *
 * @param subject what gives the value, such as "the formula 1 + i*c1"
 * @throws DispersionValueError where n < 0 or k < 0 or N is 0 or not finite
 */
export function passiveIndex(subject: string, [n, k]: Complex, wavelengthNm: number): Complex {
  const slack = -ROUNDING * Math.hypot(n, k);
  if (!isUsable([n, k]) || n < slack || k < slack) {
    throw new DispersionValueError(
      `${subject} gives N = ${complexText([n, k])} at ${wavelengthNm} nm: N = n + ik must be finite and not 0, with n >= 0 and k >= 0`,
    );
  }
  return [Math.max(n, 0), Math.max(k, 0)];
}

/**
 * N of a passive medium with this permittivity: the root with n >= 0 and k >= 0.
 *
 * @throws DispersionValueError where Im eps < 0 or eps is 0 or not finite
 */
export function passiveRoot(subject: string, [re, im]: Complex, wavelengthNm: number): Complex {
  if (!isUsable([re, im]) || im < -ROUNDING * Math.hypot(re, im)) {
    throw new DispersionValueError(
      `${subject} gives eps = ${complexText([re, im])} at ${wavelengthNm} nm: eps must be finite and not 0, with an imaginary part >= 0 (time factor exp(-iwt))`,
    );
  }
  return squareRoot([re, Math.max(im, 0)]);
}

/** @throws DispersionValueError where Q is not finite */
export function finiteVoigt(subject: string, q: Complex, wavelengthNm: number): Complex {
  if (isUsableVoigt(q)) return q;
  throw new DispersionValueError(
    `${subject} gives Q = ${complexText(q)} at ${wavelengthNm} nm: Q must be finite`,
  );
}

/** What is said of a tabulated N for which `isUsable` does not hold. */
export const unusableIndex = `|N| must lie between ${1 / LARGEST} and ${LARGEST}`;

/** What is said of a tabulated Q for which `isUsableVoigt` does not hold. */
export const unusableVoigt = `|Q| must be at most ${LARGEST}`;

export function isUsableVoigt(q: Complex): boolean {
  return Math.hypot(q[0], q[1]) <= LARGEST;
}

/** Whether N or eps is one that can be calculated with: neither 0 nor beyond the bounds, and no NaN. */
export function isUsable(value: Complex): boolean {
  const size = Math.hypot(value[0], value[1]);
  return size >= 1 / LARGEST && size <= LARGEST;
}

function complexText([re, im]: Complex): string {
  return `${re} ${im < 0 ? '-' : '+'} ${Math.abs(im)}i`;
}
