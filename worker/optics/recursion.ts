import type { Matrix2 } from './matrix2.ts';
import {
  add,
  createMatrix2,
  invert,
  multiply,
  scaleColumns,
  scaleRows,
  setDiagonal,
  subtract,
} from './matrix2.ts';
import type { Geometry } from './geometry.ts';
import { crossBySeries, slicesOf } from './crossBySeries.ts';
import type { Modes } from './modes.ts';
import { propagate } from './modes.ts';

/**
 * The way of the fields from the substrate up to the light.
 *
 * All solutions that leave the stack correctly at its back are f = M x, g = N x with two free amplitudes x; M and N
 * are 2x2 and known at the substrate (M = 1, N = Z). Each layer moves them to its upper face. x is renormalized at
 * every step so that neither a thick metal nor 100,000 layers overflow, and M and N are never divided by each other,
 * so that a node of the field is an ordinary point. `chain` keeps x at the substrate = chain x here.
 */
export class FieldState {
  readonly m: Matrix2 = createMatrix2();
  readonly n: Matrix2 = createMatrix2();
  readonly chain: Matrix2 = createMatrix2();

  /** At the upper face of the substrate. */
  start(substrate: Modes, geometry: Geometry): void {
    substrate.halfSpace(this.m, this.n, geometry);
    setDiagonal(this.chain, 1, 0, 1, 0);
  }
}

const k = createMatrix2();
const kInverse = createMatrix2();
const left = createMatrix2();
const right = createMatrix2();
const step = createMatrix2();

/**
 * One written layer: its medium's modes, its thickness, and how far waves get in it at the present point. A layer
 * inside a repeated block is crossed many times after one `update`.
 */
export class LayerStep {
  readonly modes: Modes;
  readonly layer: { readonly thicknessNm: number };
  #phase = 0;
  /** Slices of the series, where the medium's beams cannot be told apart. */
  #slices: number | null = null;
  /** Isotropic: exp(i k0 d q), its square e, and 1 - e without cancellation. */
  #phiRe = 1;
  #phiIm = 0;
  #eRe = 1;
  #eIm = 0;
  #lackRe = 0;
  #lackIm = 0;
  /** Otherwise: downward through the layer for the forward beam, upward for the backward beam. */
  readonly #down = createMatrix2();
  readonly #up = createMatrix2();

  /** @param layer its thickness is read anew at each update */
  constructor(modes: Modes, layer: { readonly thicknessNm: number }) {
    this.modes = modes;
    this.layer = layer;
  }

  /** @param k0 vacuum wave number, 1/nm */
  update(k0: number): void {
    const phase = k0 * this.layer.thicknessNm;
    const { modes } = this;
    this.#phase = phase;
    this.#slices = modes.inseparable && !modes.isotropic ? slicesOf(modes.system!, phase) : null;
    if (this.#slices !== null) return;
    if (!modes.isotropic) {
      propagate(this.#down, modes.forward, phase, 1);
      propagate(this.#up, modes.backward, phase, -1);
      return;
    }
    const decay = -phase * modes.q[1];
    const angle = phase * modes.q[0];
    const size = Math.exp(decay);
    this.#phiRe = size * Math.cos(angle);
    this.#phiIm = size * Math.sin(angle);
    this.#eRe = this.#phiRe * this.#phiRe - this.#phiIm * this.#phiIm;
    this.#eIm = 2 * this.#phiRe * this.#phiIm;
    const sine = Math.sin(angle);
    this.#lackRe = -Math.expm1(2 * decay) * Math.cos(2 * angle) + 2 * sine * sine;
    this.#lackIm = -this.#eIm;
  }

  /** Moves the state from the lower to the upper face of the layer. */
  cross(state: FieldState): void {
    if (this.layer.thicknessNm === 0) return;
    if (this.modes.isotropic) this.#crossIsotropic(state);
    else if (this.#slices !== null) crossBySeries(state, this.modes.system!, this.#phase, this.#slices);
    else this.#crossAnisotropic(state);
  }

  #crossIsotropic({ m, n, chain }: FieldState): void {
    const [zpRe, zpIm] = this.modes.zp;
    const [zsRe, zsIm] = this.modes.q;
    // left = Z M
    scaleRows(left, m, zpRe, zpIm, zsRe, zsIm);
    add(k, n, left);
    invert(kInverse, k);
    if (this.#eRe * this.#eRe + this.#eIm * this.#eIm < 0.25) {
      // Strong decay: by the reflected part G = e Z^-1 (Z M - N) K^-1 Z. What little returns from below keeps
      // its own relative accuracy instead of being a difference of large numbers.
      subtract(right, left, n);
      multiply(step, right, kInverse);
      scaleRows(step, step, this.#eRe, this.#eIm, this.#eRe, this.#eIm);
      setSimilar(right, step, this.modes);
      setDiagonal(m, 1, 0, 1, 0);
      add(m, m, right);
      setDiagonal(left, 1, 0, 1, 0);
      subtract(left, left, right);
      scaleRows(n, left, zpRe, zpIm, zsRe, zsIm);
      // x below = phi K^-1 (2 Z) x above
      scaleColumns(kInverse, kInverse, 2 * zpRe, 2 * zpIm, 2 * zsRe, 2 * zsIm);
      scaleRows(kInverse, kInverse, this.#phiRe, this.#phiIm, this.#phiRe, this.#phiIm);
    } else {
      // Weak decay: M' = ((1 + e) M + (1 - e) Z^-1 N) K^-1, N' = ((1 + e) N + (1 - e) Z M) K^-1. Here (1 - e)/Z
      // stays finite at a critical angle, where q vanishes.
      const sumRe = 1 + this.#eRe;
      const sumIm = this.#eIm;
      scaleRows(
        step,
        n,
        ...quotient(this.#lackRe, this.#lackIm, zpRe, zpIm),
        ...quotient(this.#lackRe, this.#lackIm, zsRe, zsIm),
      );
      scaleRows(right, m, sumRe, sumIm, sumRe, sumIm);
      add(right, right, step);
      multiply(m, right, kInverse);
      scaleRows(left, left, this.#lackRe, this.#lackIm, this.#lackRe, this.#lackIm);
      scaleRows(right, n, sumRe, sumIm, sumRe, sumIm);
      add(right, right, left);
      multiply(n, right, kInverse);
      // x below = 2 phi K^-1 x above
      const re = 2 * this.#phiRe;
      const im = 2 * this.#phiIm;
      scaleRows(kInverse, kInverse, re, im, re, im);
    }
    multiply(chain, chain, kInverse);
  }

  #crossAnisotropic({ m, n, chain }: FieldState): void {
    const { forward, backward, zStep, zStepInverse } = this.modes;
    // K = N - Z- M, G = (Z+ - Z-)^-1 (Z+ M - N) K^-1 (Z+ - Z-)
    multiply(left, backward.z, m);
    subtract(k, n, left);
    invert(kInverse, k);
    multiply(kInverse, kInverse, zStep);
    multiply(left, forward.z, m);
    subtract(left, left, n);
    multiply(left, zStepInverse, left);
    multiply(step, left, kInverse);
    // Through the layer: up with the backward beam, down with the forward one.
    multiply(step, this.#up, step);
    multiply(step, step, this.#down);
    setDiagonal(m, 1, 0, 1, 0);
    add(m, m, step);
    multiply(left, backward.z, step);
    add(n, forward.z, left);
    // x below = K^-1 (Z+ - Z-) exp(i k0 d P+) x above
    multiply(kInverse, kInverse, this.#down);
    multiply(chain, chain, kInverse);
  }
}

/** out = Z^-1 x Z for the diagonal Z of an isotropic medium. */
function setSimilar(out: Matrix2, x: Matrix2, modes: Modes): void {
  const [zpRe, zpIm] = modes.zp;
  const [zsRe, zsIm] = modes.q;
  const [upRe, upIm] = quotient(zsRe, zsIm, zpRe, zpIm);
  const [downRe, downIm] = quotient(zpRe, zpIm, zsRe, zsIm);
  const [b, bi, c, ci] = [x[2]!, x[3]!, x[4]!, x[5]!];
  out[0] = x[0]!;
  out[1] = x[1]!;
  out[2] = b * upRe - bi * upIm;
  out[3] = b * upIm + bi * upRe;
  out[4] = c * downRe - ci * downIm;
  out[5] = c * downIm + ci * downRe;
  out[6] = x[6]!;
  out[7] = x[7]!;
}

function quotient(aRe: number, aIm: number, bRe: number, bIm: number): [number, number] {
  const size = bRe * bRe + bIm * bIm;
  // A q of 1e-150 at a critical angle squares to nothing; its phase is real, so divide by that alone.
  if (size === 0) return [aRe / bRe, aIm / bRe];
  return [(aRe * bRe + aIm * bIm) / size, (aIm * bRe - aRe * bIm) / size];
}
