/**
 * Complex 2x2 matrices for the stack recursion: eight doubles `[a, b; c, d]` as re, im in the order a, b, c, d.
 *
 * Every function writes into `out` and allocates nothing. `out` may be one of the operands.
 * Products are written out element by element, so an off-diagonal element that is tiny keeps its own relative
 * accuracy: each of its terms carries exactly one tiny factor. The solver leans on this for Voigt constants as
 * small as 1e-15.
 */
export type Matrix2 = Float64Array;

export function createMatrix2(): Matrix2 {
  return new Float64Array(8);
}

export function setDiagonal(out: Matrix2, aRe: number, aIm: number, dRe: number, dIm: number): void {
  out[0] = aRe;
  out[1] = aIm;
  out[2] = 0;
  out[3] = 0;
  out[4] = 0;
  out[5] = 0;
  out[6] = dRe;
  out[7] = dIm;
}

/** out = x y */
export function multiply(out: Matrix2, x: Matrix2, y: Matrix2): void {
  const x0 = x[0]!,
    x1 = x[1]!,
    x2 = x[2]!,
    x3 = x[3]!,
    x4 = x[4]!,
    x5 = x[5]!,
    x6 = x[6]!,
    x7 = x[7]!;
  const y0 = y[0]!,
    y1 = y[1]!,
    y2 = y[2]!,
    y3 = y[3]!,
    y4 = y[4]!,
    y5 = y[5]!,
    y6 = y[6]!,
    y7 = y[7]!;
  out[0] = x0 * y0 - x1 * y1 + x2 * y4 - x3 * y5;
  out[1] = x0 * y1 + x1 * y0 + x2 * y5 + x3 * y4;
  out[2] = x0 * y2 - x1 * y3 + x2 * y6 - x3 * y7;
  out[3] = x0 * y3 + x1 * y2 + x2 * y7 + x3 * y6;
  out[4] = x4 * y0 - x5 * y1 + x6 * y4 - x7 * y5;
  out[5] = x4 * y1 + x5 * y0 + x6 * y5 + x7 * y4;
  out[6] = x4 * y2 - x5 * y3 + x6 * y6 - x7 * y7;
  out[7] = x4 * y3 + x5 * y2 + x6 * y7 + x7 * y6;
}

/** out = x - y */
export function subtract(out: Matrix2, x: Matrix2, y: Matrix2): void {
  for (let i = 0; i < 8; i++) out[i] = x[i]! - y[i]!;
}

/** out = x + y */
export function add(out: Matrix2, x: Matrix2, y: Matrix2): void {
  for (let i = 0; i < 8; i++) out[i] = x[i]! + y[i]!;
}

export function determinant(x: Matrix2): [re: number, im: number] {
  return [
    x[0]! * x[6]! - x[1]! * x[7]! - x[2]! * x[4]! + x[3]! * x[5]!,
    x[0]! * x[7]! + x[1]! * x[6]! - x[2]! * x[5]! - x[3]! * x[4]!,
  ];
}

/** Smallest determinant that invert divides by; an exact zero is a guided mode met by accident. */
const TINY = 1e-280;

/** out = 1 / x */
export function invert(out: Matrix2, x: Matrix2): void {
  const a = x[0]!,
    ai = x[1]!,
    b = x[2]!,
    bi = x[3]!,
    c = x[4]!,
    ci = x[5]!,
    d = x[6]!,
    di = x[7]!;
  const detRe = a * d - ai * di - b * c + bi * ci;
  const detIm = a * di + ai * d - b * ci - bi * c;
  const size = detRe * detRe + detIm * detIm;
  const scale = size > TINY ? 1 / size : 1 / TINY;
  const re = size > TINY ? detRe * scale : 1 / Math.sqrt(TINY);
  const im = -detIm * scale;
  out[0] = d * re - di * im;
  out[1] = d * im + di * re;
  out[2] = -(b * re - bi * im);
  out[3] = -(b * im + bi * re);
  out[4] = -(c * re - ci * im);
  out[5] = -(c * im + ci * re);
  out[6] = a * re - ai * im;
  out[7] = a * im + ai * re;
}

/** out = diag(first, second) x */
export function scaleRows(
  out: Matrix2,
  x: Matrix2,
  aRe: number,
  aIm: number,
  dRe: number,
  dIm: number,
): void {
  for (let i = 0; i < 4; i += 2) {
    const re = x[i]!;
    const im = x[i + 1]!;
    out[i] = aRe * re - aIm * im;
    out[i + 1] = aRe * im + aIm * re;
  }
  for (let i = 4; i < 8; i += 2) {
    const re = x[i]!;
    const im = x[i + 1]!;
    out[i] = dRe * re - dIm * im;
    out[i + 1] = dRe * im + dIm * re;
  }
}

/** out = x diag(first, second) */
export function scaleColumns(
  out: Matrix2,
  x: Matrix2,
  aRe: number,
  aIm: number,
  dRe: number,
  dIm: number,
): void {
  for (let i = 0; i < 8; i += 4) {
    const re = x[i]!;
    const im = x[i + 1]!;
    out[i] = aRe * re - aIm * im;
    out[i + 1] = aRe * im + aIm * re;
    const re2 = x[i + 2]!;
    const im2 = x[i + 3]!;
    out[i + 2] = dRe * re2 - dIm * im2;
    out[i + 3] = dRe * im2 + dIm * re2;
  }
}
