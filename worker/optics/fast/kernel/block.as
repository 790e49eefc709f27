import { add, at, both, im, inverseNorm, mul, put, re, sub, V } from './simd.as';

// A repeated block as a whole: the 4x4 matrix that takes (f, h) from its lower to its upper face.
//   matrix   rows f1, f2, h1, h2; element (row, column) in slots 8 row + 2 column and the next

/** The matrix of a plain layer, as in plain.as. */
export function matrixPlain(pairs: i32, layer: usize, matrix: usize): void {
  memory.fill(matrix, 0, <usize>pairs * 32 * V);
  for (let i = 0; i < pairs; i++) {
    for (let part: usize = 0; part < 2; part++) {
      const c = at(layer + part * V, 0);
      put(matrix + part * V, 0, c);
      put(matrix + part * V, 10, c);
      put(matrix + part * V, 20, c);
      put(matrix + part * V, 30, c);
      put(matrix + part * V, 4, at(layer + part * V, 4));
      put(matrix + part * V, 14, at(layer + part * V, 2));
      put(matrix + part * V, 16, f64x2.neg(at(layer + part * V, 6)));
      put(matrix + part * V, 26, f64x2.neg(at(layer + part * V, 8)));
    }
    layer += 14 * V;
    matrix += 32 * V;
  }
}

/** The matrix of a gyrotropic layer: exp(k0 d K) taken from (f, lambda f) to (f, h). */
export function matrixGyrotropic(pairs: i32, gyro: usize, stride: usize, map: usize, matrix: usize): void {
  for (let i = 0; i < pairs; i++) {
    const a1Re = at(map, 24);
    const a1Im = at(map, 25);
    const u12Re = at(gyro, 6);
    const u12Im = at(gyro, 7);
    const u21Re = at(gyro, 8);
    const u21Im = at(gyro, 9);
    const kRe = at(gyro, 2);
    const kIm = at(gyro, 3);
    for (let row: usize = 0; row < 2; row++) {
      const e1Re = at(map + 4 * row * V, 0);
      const e1Im = at(map + 4 * row * V, 1);
      const e2Re = at(map + 4 * row * V, 2);
      const e2Im = at(map + 4 * row * V, 3);
      const f1Re = at(map + 4 * row * V, 8);
      const f1Im = at(map + 4 * row * V, 9);
      const f2Re = at(map + 4 * row * V, 10);
      const f2Im = at(map + 4 * row * V, 11);
      const f = matrix + 8 * row * V;
      // f rows: E11 + E12 A, E12 B
      put(f, 0, add(e1Re, re(f1Re, f1Im, a1Re, a1Im)));
      put(f, 1, add(e1Im, im(f1Re, f1Im, a1Re, a1Im)));
      put(f, 2, add(e2Re, re(f1Re, f1Im, u12Re, u12Im)));
      put(f, 3, add(e2Im, im(f1Re, f1Im, u12Re, u12Im)));
      put(f, 4, re(f1Re, f1Im, kRe, kIm));
      put(f, 5, im(f1Re, f1Im, kRe, kIm));
      put(f, 6, f2Re);
      put(f, 7, f2Im);
      // lambda f rows: E22 = E11 + E12 U, then -E12 V + E22 A and E22 B
      const g1Re = add(e1Re, re(f2Re, f2Im, u21Re, u21Im));
      const g1Im = add(e1Im, im(f2Re, f2Im, u21Re, u21Im));
      const g2Re = add(e2Re, re(f1Re, f1Im, u12Re, u12Im));
      const g2Im = add(e2Im, im(f1Re, f1Im, u12Re, u12Im));
      const w = matrix + (16 + 8 * row) * V;
      for (let column: usize = 0; column < 4; column += 2) {
        const v1Re = at(map + column * V, 16);
        const v1Im = at(map + column * V, 17);
        const v2Re = at(map + column * V, 20);
        const v2Im = at(map + column * V, 21);
        const xRe = column === 0 ? a1Re : u12Re;
        const xIm = column === 0 ? a1Im : u12Im;
        put(w + column * V, 0,
          sub(re(g1Re, g1Im, xRe, xIm), add(re(f1Re, f1Im, v1Re, v1Im), re(f2Re, f2Im, v2Re, v2Im))),
        );
        put(w + column * V, 1,
          sub(im(g1Re, g1Im, xRe, xIm), add(im(f1Re, f1Im, v1Re, v1Im), im(f2Re, f2Im, v2Re, v2Im))),
        );
      }
      put(w, 4, re(g1Re, g1Im, kRe, kIm));
      put(w, 5, im(g1Re, g1Im, kRe, kIm));
      put(w, 6, g2Re);
      put(w, 7, g2Im);
    }
    // h1 = (lambda f1 - A1 f)/kappa; h2 = lambda f2 as it stands.
    const pRe = at(gyro, 4);
    const pIm = at(gyro, 5);
    for (let column: usize = 0; column < 8; column += 2) {
      const f1Re = at(matrix + column * V, 0);
      const f1Im = at(matrix + column * V, 1);
      const f2Re = at(matrix + column * V, 8);
      const f2Im = at(matrix + column * V, 9);
      const lRe = sub(
        at(matrix + column * V, 16),
        add(re(a1Re, a1Im, f1Re, f1Im), re(u12Re, u12Im, f2Re, f2Im)),
      );
      const lIm = sub(
        at(matrix + column * V, 17),
        add(im(a1Re, a1Im, f1Re, f1Im), im(u12Re, u12Im, f2Re, f2Im)),
      );
      put(matrix + column * V, 16, re(lRe, lIm, pRe, pIm));
      put(matrix + column * V, 17, im(lRe, lIm, pRe, pIm));
    }
    gyro += stride;
    map += 26 * V;
    matrix += 32 * V;
  }
}

/** A plain layer on top of what `matrix` holds, in place: rows f and h of one polarization mix. */
export function stackPlain(pairs: i32, layer: usize, matrix: usize): void {
  for (let i = 0; i < pairs; i++) {
    const cRe = at(layer, 0);
    const cIm = at(layer, 1);
    for (let polarization: usize = 0; polarization < 2; polarization++) {
      const upRe = at(layer + (0 - 2 * polarization) * V, 4);
      const upIm = at(layer + (0 - 2 * polarization) * V, 5);
      const downRe = at(layer + 2 * polarization * V, 6);
      const downIm = at(layer + 2 * polarization * V, 7);
      const f = matrix + 8 * polarization * V;
      for (let column: usize = 0; column < 8; column += 2) {
        const fRe = at(f + column * V, 0);
        const fIm = at(f + column * V, 1);
        const hRe = at(f + column * V, 16);
        const hIm = at(f + column * V, 17);
        put(f + column * V, 0, add(re(cRe, cIm, fRe, fIm), re(upRe, upIm, hRe, hIm)));
        put(f + column * V, 1, add(im(cRe, cIm, fRe, fIm), im(upRe, upIm, hRe, hIm)));
        put(f + column * V, 16, sub(re(cRe, cIm, hRe, hIm), re(downRe, downIm, fRe, fIm)));
        put(f + column * V, 17, sub(im(cRe, cIm, hRe, hIm), im(downRe, downIm, fRe, fIm)));
      }
    }
    layer += 14 * V;
    matrix += 32 * V;
  }
}

/** A plain layer below what `matrix` holds, in place: columns f and h of one polarization mix. */
export function stackPlainBelow(pairs: i32, layer: usize, matrix: usize): void {
  for (let i = 0; i < pairs; i++) {
    const cRe = at(layer, 0);
    const cIm = at(layer, 1);
    for (let polarization: usize = 0; polarization < 2; polarization++) {
      const upRe = at(layer + (0 - 2 * polarization) * V, 4);
      const upIm = at(layer + (0 - 2 * polarization) * V, 5);
      const downRe = at(layer + 2 * polarization * V, 6);
      const downIm = at(layer + 2 * polarization * V, 7);
      const f = matrix + 2 * polarization * V;
      for (let row: usize = 0; row < 32; row += 8) {
        const fRe = at(f + row * V, 0);
        const fIm = at(f + row * V, 1);
        const hRe = at(f + row * V, 4);
        const hIm = at(f + row * V, 5);
        put(f + row * V, 0, sub(re(cRe, cIm, fRe, fIm), re(downRe, downIm, hRe, hIm)));
        put(f + row * V, 1, sub(im(cRe, cIm, fRe, fIm), im(downRe, downIm, hRe, hIm)));
        put(f + row * V, 4, add(re(cRe, cIm, hRe, hIm), re(upRe, upIm, fRe, fIm)));
        put(f + row * V, 5, add(im(cRe, cIm, hRe, hIm), im(upRe, upIm, fRe, fIm)));
      }
    }
    layer += 14 * V;
    matrix += 32 * V;
  }
}

/** One element of a matrix product: row (a b c d) times a column of `lower`. */
@inline
function element(
  product: usize,
  lower: usize,
  column: usize,
  aRe: v128,
  aIm: v128,
  bRe: v128,
  bIm: v128,
  cRe: v128,
  cIm: v128,
  dRe: v128,
  dIm: v128,
): void {
  const xRe = at(lower, column);
  const xIm = at(lower, column + 1);
  const yRe = at(lower, column + 8);
  const yIm = at(lower, column + 9);
  let sumRe = add(re(aRe, aIm, xRe, xIm), re(bRe, bIm, yRe, yIm));
  let sumIm = add(im(aRe, aIm, xRe, xIm), im(bRe, bIm, yRe, yIm));
  const zRe = at(lower, column + 16);
  const zIm = at(lower, column + 17);
  const wRe = at(lower, column + 24);
  const wIm = at(lower, column + 25);
  sumRe = add(sumRe, add(re(cRe, cIm, zRe, zIm), re(dRe, dIm, wRe, wIm)));
  sumIm = add(sumIm, add(im(cRe, cIm, zRe, zIm), im(dRe, dIm, wRe, wIm)));
  put(product, column, sumRe);
  put(product, column + 1, sumIm);
}

/** product = upper lower; must not overlap. */
export function multiply(pairs: i32, upper: usize, lower: usize, product: usize): void {
  for (let i = 0; i < pairs; i++) {
    for (let row: usize = 0; row < 4; row++) {
      const aRe = at(upper, 0);
      const aIm = at(upper, 1);
      const bRe = at(upper, 2);
      const bIm = at(upper, 3);
      const cRe = at(upper, 4);
      const cIm = at(upper, 5);
      const dRe = at(upper, 6);
      const dIm = at(upper, 7);
      element(product, lower, 0, aRe, aIm, bRe, bIm, cRe, cIm, dRe, dIm);
      element(product, lower, 2, aRe, aIm, bRe, bIm, cRe, cIm, dRe, dIm);
      element(product, lower, 4, aRe, aIm, bRe, bIm, cRe, cIm, dRe, dIm);
      element(product, lower, 6, aRe, aIm, bRe, bIm, cRe, cIm, dRe, dIm);
      upper += 8 * V;
      product += 8 * V;
    }
    lower += 32 * V;
  }
}

/** One element of [M; N]: a row of the matrix times a column of [1; Y]. */
@inline
function crossElement(
  matrix: usize,
  state: usize,
  work: usize,
  column: usize,
  cRe: v128,
  cIm: v128,
  dRe: v128,
  dIm: v128,
): void {
  const xRe = at(state, column);
  const xIm = at(state, column + 1);
  const yRe = at(state, column + 4);
  const yIm = at(state, column + 5);
  put(work, column, add(at(matrix, column), add(re(cRe, cIm, xRe, xIm), re(dRe, dIm, yRe, yIm))));
  put(work, column + 1, add(at(matrix, column + 1), add(im(cRe, cIm, xRe, xIm), im(dRe, dIm, yRe, yIm))));
}

@inline
function crossMatrixRow(matrix: usize, state: usize, work: usize): void {
  const cRe = at(matrix, 4);
  const cIm = at(matrix, 5);
  const dRe = at(matrix, 6);
  const dIm = at(matrix, 7);
  crossElement(matrix, state, work, 0, cRe, cIm, dRe, dIm);
  crossElement(matrix, state, work, 2, cRe, cIm, dRe, dIm);
}

/** Crosses the block: [M; N] = matrix [1; Y] to `work` (0-7 and 8-15). */
export function crossMatrix(pairs: i32, matrix: usize, state: usize, work: usize): void {
  for (let i = 0; i < pairs; i++) {
    crossMatrixRow(matrix, state, work);
    crossMatrixRow(matrix + 8 * V, state, work + 4 * V);
    crossMatrixRow(matrix + 16 * V, state, work + 8 * V);
    crossMatrixRow(matrix + 24 * V, state, work + 12 * V);
    matrix += 32 * V;
    state += 8 * V;
    work += 16 * V;
  }
}

/** One row of N M^-1, M = [a b; c d], by the adjoint and 1 / det M. */
@inline
function settleRow(work: usize, row: usize, state: usize, invRe: v128, invIm: v128): void {
  const n1Re = at(row, 0);
  const n1Im = at(row, 1);
  const n2Re = at(row, 2);
  const n2Im = at(row, 3);
  const lRe = sub(re(n1Re, n1Im, at(work, 6), at(work, 7)), re(n2Re, n2Im, at(work, 4), at(work, 5)));
  const lIm = sub(im(n1Re, n1Im, at(work, 6), at(work, 7)), im(n2Re, n2Im, at(work, 4), at(work, 5)));
  put(state, 0, re(lRe, lIm, invRe, invIm));
  put(state, 1, im(lRe, lIm, invRe, invIm));
  const rRe = sub(re(n2Re, n2Im, at(work, 0), at(work, 1)), re(n1Re, n1Im, at(work, 2), at(work, 3)));
  const rIm = sub(im(n2Re, n2Im, at(work, 0), at(work, 1)), im(n1Re, n1Im, at(work, 2), at(work, 3)));
  put(state, 2, re(rRe, rIm, invRe, invIm));
  put(state, 3, im(rRe, rIm, invRe, invIm));
}

/** Y' = N M^-1 from `work`. */
export function settle(pairs: i32, work: usize, state: usize): void {
  for (let i = 0; i < pairs; i++) {
    const detRe = sub(
      re(at(work, 0), at(work, 1), at(work, 6), at(work, 7)),
      re(at(work, 2), at(work, 3), at(work, 4), at(work, 5)),
    );
    const detIm = sub(
      im(at(work, 0), at(work, 1), at(work, 6), at(work, 7)),
      im(at(work, 2), at(work, 3), at(work, 4), at(work, 5)),
    );
    const scale = inverseNorm(detRe, detIm);
    const invRe = mul(detRe, scale);
    const invIm = f64x2.neg(mul(detIm, scale));
    settleRow(work, work + 8 * V, state, invRe, invIm);
    settleRow(work, work + 12 * V, state + 4 * V, invRe, invIm);
    work += 16 * V;
    state += 8 * V;
  }
}
