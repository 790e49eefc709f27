import type { Complex } from '../../shared/complex.ts';
import { modulus } from './complexNumber.ts';
import type { Matrix2 } from './matrix2.ts';
import { add, createMatrix2, invert, multiply } from './matrix2.ts';
import type { FieldSystem } from './waveEquation.ts';

/** The fields f = m x, g = n x, and x at the substrate = chain x here. */
type Fields = { m: Matrix2; n: Matrix2; chain: Matrix2 };

/** A slice is so thin that k0 d times the size of the system stays below this; the series then needs few terms. */
const SLICE = 0.5;
const TERMS = 16;

/** Beyond this many slices the series takes too long; the layer is then crossed by its beams. */
const MOST_SLICES = 4096;

/** How many slices a layer needs; null for more than it may have. */
export function slicesOf(system: FieldSystem, phase: number): number | null {
  const size = Math.max(1, ...Object.values(system).map(modulus));
  const slices = Math.max(1, Math.ceil((phase * size) / SLICE));
  return slices <= MOST_SLICES ? slices : null;
}

const blocks = { a: createMatrix2(), b: createMatrix2(), c: createMatrix2(), f: createMatrix2() };
const termM = createMatrix2();
const termN = createMatrix2();
const nextM = createMatrix2();
const product = createMatrix2();

/**
 * Moves the fields from the lower to the upper face of a layer without its modes: exp(-i k0 d D) by its series in
 * thin slices, x normalized after each. Slow, exact, and indifferent to modes that coincide: for a magnetic layer at
 * its own critical angle, or one in which b11 vanishes.
 *
 * @param phase k0 d
 * @param slices as `slicesOf` gives them
 */
export function crossBySeries(state: Fields, system: FieldSystem, phase: number, slices: number): void {
  const { a11, a12, b11, c11, c12, c21, c22, f11, f21 } = system;
  const none: Complex = [0, 0];
  blocks.a.set([...a11, ...a12, ...none, ...none]);
  blocks.b.set([...b11, ...none, ...none, 1, 0]);
  blocks.c.set([...c11, ...c12, ...c21, ...c22]);
  blocks.f.set([...f11, ...none, ...f21, ...none]);
  for (let i = 0; i < slices; i++) crossSlice(state, phase / slices);
}

function crossSlice({ m, n, chain }: Fields, phase: number): void {
  termM.set(m);
  termN.set(n);
  for (let order = 1; order <= TERMS; order++) {
    // The next term is -i phase / order times the system applied to the last one.
    const factor = phase / order;
    apply(nextM, blocks.a, termM, blocks.b, termN, factor);
    apply(termN, blocks.c, termM, blocks.f, termN, factor);
    termM.set(nextM);
    add(m, m, termM);
    add(n, n, termN);
  }
  add(product, n, m);
  invert(product, product);
  multiply(m, m, product);
  multiply(n, n, product);
  multiply(chain, chain, product);
}

const first = createMatrix2();
const second = createMatrix2();

/** out = -i factor (p x + q y) */
function apply(out: Matrix2, p: Matrix2, x: Matrix2, q: Matrix2, y: Matrix2, factor: number): void {
  multiply(first, p, x);
  multiply(second, q, y);
  for (let i = 0; i < 8; i += 2) {
    const re = first[i]! + second[i]!;
    const im = first[i + 1]! + second[i + 1]!;
    out[i] = factor * im;
    out[i + 1] = -factor * re;
  }
}
