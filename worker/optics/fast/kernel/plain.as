import { cosineOf, decayOf, quarterTurns, sineOf, storeForwardRoot, withinQuarter } from './functions.as';
import { add, at, both, choose, div, entry, im, inverseNorm, mul, norm, put, re, sub, V } from './simd.as';

// Layers without gyration. With phi = k0 d q, q^2 = eps - xi^2, going up through the layer (g = i h):
//   f1' = C f1 + P h1,  h1' = C h1 - G f1,   f2' = C f2 + S h2,  h2' = C h2 - F f2,
//   C = cos(phi), S = k0 d sin(phi)/phi, P = eps S, F = q^2 S, G = F/eps.
// C and S are even in q: thin layers need neither q itself nor its sign, and nothing happens at a critical angle.
//   layer    0-1 C, 2-3 S, 4-5 P, 6-7 G, 8-9 F, 10-11 U, 12-13 exp(i phi)
// A layer in which waves decay has all of 0-9 multiplied by exp(i phi), and U = exp(2 i phi); else U = 1.

/** (-1)^k / (2k)! */
const COSINE_SERIES: usize = memory.data<f64>([
  1.0, -0.5, 4.1666666666666664e-2, -1.388888888888889e-3, 2.48015873015873e-5, -2.755731922398589e-7,
  2.08767569878681e-9, -1.1470745597729725e-11, 4.779477332387385e-14, -1.5619206968586225e-16,
  4.110317623312165e-19, -8.896791392450574e-22, 1.6117375710961184e-24, -2.4795962632247976e-27,
  3.279889237069838e-30, -3.7699876288159054e-33, 3.8004004524354893e-36, -3.387166178818617e-39,
  2.6882271260465215e-42, -1.911968937657938e-45,
]);

/** (-1)^k / (2k+1)! */
const SINE_SERIES: usize = memory.data<f64>([
  1.0, -1.6666666666666666e-1, 8.333333333333333e-3, -1.984126984126984e-4, 2.7557319223985893e-6,
  -2.505210838544172e-8, 1.6059043836821613e-10, -7.647163731819816e-13, 2.8114572543455206e-15,
  -8.22063524662433e-18, 1.9572941063391263e-20, -3.868170170630684e-23, 6.446950284384474e-26,
  -9.183689863795546e-29, 1.1309962886447716e-31, -1.216125041553518e-34, 1.1516365006269668e-37,
  -9.67761765376748e-41, 7.265478719044653e-44, -4.902484455533174e-47,
]);

/** Completes a record from C and S. */
@inline
function putProducts(layer: usize, plain: usize, qqRe: v128, qqIm: v128, sRe: v128, sIm: v128): void {
  put(layer, 2, sRe);
  put(layer, 3, sIm);
  const epsRe = at(plain, 0);
  const epsIm = at(plain, 1);
  put(layer, 4, re(epsRe, epsIm, sRe, sIm));
  put(layer, 5, im(epsRe, epsIm, sRe, sIm));
  const fRe = re(qqRe, qqIm, sRe, sIm);
  const fIm = im(qqRe, qqIm, sRe, sIm);
  put(layer, 8, fRe);
  put(layer, 9, fIm);
  put(layer, 6, re(fRe, fIm, at(plain, 2), at(plain, 3)));
  put(layer, 7, im(fRe, fIm, at(plain, 2), at(plain, 3)));
}

/**
 * Layers of |phi| up to about 4: power series in x = phi^2. The coefficients are real, so division by the real
 * quadratic (X - x)(X - conj x) takes half the work of Horner's rule (Knuth, TAOCP 2, 4.6.4, eq. (3)).
 *
 * @param phase k0 (or k0 d with thickness 1), phaseStride apart
 * @param degree last power of x, >= 2
 */
export function traceThin(
  pairs: i32,
  plain: usize,
  stride: usize,
  place: usize,
  phase: usize,
  phaseStride: usize,
  thickness: f64,
  degree: usize,
  layer: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const k0d = mul(v128.load(phase), both(thickness));
    const square = mul(k0d, k0d);
    const qqRe = add(at(plain, 4), at(place, 2));
    const qqIm = at(plain, 5);
    const xRe = mul(square, qqRe);
    const xIm = mul(square, qqIm);
    const r = add(xRe, xRe);
    const s = f64x2.neg(norm(xRe, xIm));
    let c2 = entry(COSINE_SERIES, degree);
    let s2 = entry(SINE_SERIES, degree);
    let c1 = add(entry(COSINE_SERIES, degree - 1), mul(r, c2));
    let s1 = add(entry(SINE_SERIES, degree - 1), mul(r, s2));
    for (let k = degree - 2; k > 0; k--) {
      const c = add(add(entry(COSINE_SERIES, k), mul(s, c2)), mul(r, c1));
      c2 = c1;
      c1 = c;
      const t = add(add(entry(SINE_SERIES, k), mul(s, s2)), mul(r, s1));
      s2 = s1;
      s1 = t;
    }
    const one = both(1);
    put(layer, 0, add(add(one, mul(s, c2)), mul(xRe, c1)));
    put(layer, 1, mul(xIm, c1));
    putProducts(
      layer,
      plain,
      qqRe,
      qqIm,
      mul(k0d, add(add(one, mul(s, s2)), mul(xRe, s1))),
      mul(k0d, mul(xIm, s1)),
    );
    plain += stride;
    place += 4 * V;
    phase += phaseStride;
    layer += 14 * V;
  }
}

/** Any other layer, by exponentials; lanes with |phi| < 1 keep the series, where (1 - exp)/q would lose digits. */
export function traceThick(
  pairs: i32,
  plain: usize,
  stride: usize,
  place: usize,
  phase: usize,
  phaseStride: usize,
  thickness: f64,
  layer: usize,
): void {
  traceThin(pairs, plain, stride, place, phase, phaseStride, thickness, 9, layer);
  for (let i = 0; i < pairs; i++) {
    const k0d = mul(v128.load(phase), both(thickness));
    const qqRe = add(at(plain, 4), at(place, 2));
    const qqIm = at(plain, 5);
    // Slots 12-13 hold q for a moment.
    storeForwardRoot(layer + 12 * V, qqRe, qqIm);
    const qRe = at(layer, 12);
    const qIm = at(layer, 13);
    const thin = f64x2.lt(mul(mul(k0d, k0d), norm(qRe, qIm)), both(1));
    const turn = mul(k0d, qRe);
    const n = quarterTurns(turn);
    const rest = withinQuarter(turn, n);
    const size = decayOf(f64x2.neg(mul(k0d, qIm)));
    const phiRe = mul(size, cosineOf(rest, n));
    const phiIm = mul(size, sineOf(rest, n));
    const eRe = re(phiRe, phiIm, phiRe, phiIm);
    const eIm = im(phiRe, phiIm, phiRe, phiIm);
    // cos(phi) exp(i phi) = (1 + e)/2, sin(phi) exp(i phi) = i (1 - e)/2
    const half = both(0.5);
    const scale = mul(half, inverseNorm(qRe, qIm));
    const uRe = mul(eIm, scale);
    const uIm = mul(sub(both(1), eRe), scale);
    // Thin lanes: the series times exp(i phi), so that every lane is scaled alike.
    const cRe = at(layer, 0);
    const cIm = at(layer, 1);
    const sRe = at(layer, 2);
    const sIm = at(layer, 3);
    put(layer, 0, choose(thin, re(cRe, cIm, phiRe, phiIm), mul(half, add(both(1), eRe))));
    put(layer, 1, choose(thin, im(cRe, cIm, phiRe, phiIm), mul(half, eIm)));
    putProducts(
      layer,
      plain,
      qqRe,
      qqIm,
      choose(thin, re(sRe, sIm, phiRe, phiIm), re(uRe, uIm, qRe, f64x2.neg(qIm))),
      choose(thin, im(sRe, sIm, phiRe, phiIm), im(uRe, uIm, qRe, f64x2.neg(qIm))),
    );
    put(layer, 10, eRe);
    put(layer, 11, eIm);
    put(layer, 12, phiRe);
    put(layer, 13, phiIm);
    plain += stride;
    place += 4 * V;
    phase += phaseStride;
    layer += 14 * V;
  }
}

/** One polarization: M = c + (aRe, aIm) y, N = c y - (bRe, bIm). */
@inline
function crossOne(state: usize, cRe: v128, cIm: v128, aRe: v128, aIm: v128, bRe: v128, bIm: v128): void {
  const yRe = at(state, 0);
  const yIm = at(state, 1);
  const mRe = add(cRe, re(aRe, aIm, yRe, yIm));
  const mIm = add(cIm, im(aRe, aIm, yRe, yIm));
  const nRe = sub(re(cRe, cIm, yRe, yIm), bRe);
  const nIm = sub(im(cRe, cIm, yRe, yIm), bIm);
  const scale = inverseNorm(mRe, mIm);
  put(state, 0, mul(scale, add(mul(nRe, mRe), mul(nIm, mIm))));
  put(state, 1, mul(scale, sub(mul(nIm, mRe), mul(nRe, mIm))));
}

/** y' = (C y - G)/(C + P y) and (C y - F)/(C + S y): a plain layer below all magnetic ones. */
export function crossDiagonal(pairs: i32, layer: usize, state: usize): void {
  for (let i = 0; i < pairs; i++) {
    const cRe = at(layer, 0);
    const cIm = at(layer, 1);
    crossOne(state, cRe, cIm, at(layer, 4), at(layer, 5), at(layer, 6), at(layer, 7));
    crossOne(state + 6 * V, cRe, cIm, at(layer, 2), at(layer, 3), at(layer, 8), at(layer, 9));
    layer += 14 * V;
    state += 8 * V;
  }
}

/**
 * A plain layer above magnetic ones. With M = C + diag(P, S) Y and w = Y12 Y21:
 *   Y11' = ((C Y11 - G) M22 - C S w) / det M,  Y22' = ((C Y22 - F) M11 - C P w) / det M,
 *   Y12' = U Y12 / det M, Y21' = U Y21 / det M, since C^2 + P G = C^2 + S F = U.
 * The coupling passes by products alone: its relative accuracy survives any absorbing cap.
 */
export function crossPlain(pairs: i32, layer: usize, state: usize, scaled: i32): void {
  for (let i = 0; i < pairs; i++) {
    const cRe = at(layer, 0);
    const cIm = at(layer, 1);
    let yRe = at(state, 0);
    let yIm = at(state, 1);
    let aRe = at(layer, 4);
    let aIm = at(layer, 5);
    const m1Re = add(cRe, re(aRe, aIm, yRe, yIm));
    const m1Im = add(cIm, im(aRe, aIm, yRe, yIm));
    const n1Re = sub(re(cRe, cIm, yRe, yIm), at(layer, 6));
    const n1Im = sub(im(cRe, cIm, yRe, yIm), at(layer, 7));
    yRe = at(state, 6);
    yIm = at(state, 7);
    aRe = at(layer, 2);
    aIm = at(layer, 3);
    const m2Re = add(cRe, re(aRe, aIm, yRe, yIm));
    const m2Im = add(cIm, im(aRe, aIm, yRe, yIm));
    const n2Re = sub(re(cRe, cIm, yRe, yIm), at(layer, 8));
    const n2Im = sub(im(cRe, cIm, yRe, yIm), at(layer, 9));
    const y12Re = at(state, 2);
    const y12Im = at(state, 3);
    const y21Re = at(state, 4);
    const y21Im = at(state, 5);
    const wRe = re(y12Re, y12Im, y21Re, y21Im);
    const wIm = im(y12Re, y12Im, y21Re, y21Im);
    // S w, P S w, C S w, C P w
    const swRe = re(aRe, aIm, wRe, wIm);
    const swIm = im(aRe, aIm, wRe, wIm);
    const pRe = at(layer, 4);
    const pIm = at(layer, 5);
    const pwRe = re(pRe, pIm, wRe, wIm);
    const pwIm = im(pRe, pIm, wRe, wIm);
    const detRe = sub(re(m1Re, m1Im, m2Re, m2Im), re(pRe, pIm, swRe, swIm));
    const detIm = sub(im(m1Re, m1Im, m2Re, m2Im), im(pRe, pIm, swRe, swIm));
    const scale = inverseNorm(detRe, detIm);
    const invRe = mul(detRe, scale);
    const invIm = f64x2.neg(mul(detIm, scale));
    const t1Re = sub(re(n1Re, n1Im, m2Re, m2Im), re(cRe, cIm, swRe, swIm));
    const t1Im = sub(im(n1Re, n1Im, m2Re, m2Im), im(cRe, cIm, swRe, swIm));
    put(state, 0, re(t1Re, t1Im, invRe, invIm));
    put(state, 1, im(t1Re, t1Im, invRe, invIm));
    const t2Re = sub(re(n2Re, n2Im, m1Re, m1Im), re(cRe, cIm, pwRe, pwIm));
    const t2Im = sub(im(n2Re, n2Im, m1Re, m1Im), im(cRe, cIm, pwRe, pwIm));
    put(state, 6, re(t2Re, t2Im, invRe, invIm));
    put(state, 7, im(t2Re, t2Im, invRe, invIm));
    let uRe = invRe;
    let uIm = invIm;
    if (scaled) {
      uRe = re(invRe, invIm, at(layer, 10), at(layer, 11));
      uIm = im(invRe, invIm, at(layer, 10), at(layer, 11));
    }
    put(state, 2, re(y12Re, y12Im, uRe, uIm));
    put(state, 3, im(y12Re, y12Im, uRe, uIm));
    put(state, 4, re(y21Re, y21Im, uRe, uIm));
    put(state, 5, im(y21Re, y21Im, uRe, uIm));
    layer += 14 * V;
    state += 8 * V;
  }
}

/**
 * Before `crossPlain` or `crossDiagonal`, for T: M = C + diag(P, S) Y to slots 0-7 of `work`, and to 8-9 what X M^-1
 * is to be multiplied by where M is stored times exp(i phi).
 */
export function chainPlain(pairs: i32, layer: usize, state: usize, scaled: i32, work: usize): void {
  for (let i = 0; i < pairs; i++) {
    const pRe = at(layer, 4);
    const pIm = at(layer, 5);
    const sRe = at(layer, 2);
    const sIm = at(layer, 3);
    put(work, 0, add(at(layer, 0), re(pRe, pIm, at(state, 0), at(state, 1))));
    put(work, 1, add(at(layer, 1), im(pRe, pIm, at(state, 0), at(state, 1))));
    put(work, 2, re(pRe, pIm, at(state, 2), at(state, 3)));
    put(work, 3, im(pRe, pIm, at(state, 2), at(state, 3)));
    put(work, 4, re(sRe, sIm, at(state, 4), at(state, 5)));
    put(work, 5, im(sRe, sIm, at(state, 4), at(state, 5)));
    put(work, 6, add(at(layer, 0), re(sRe, sIm, at(state, 6), at(state, 7))));
    put(work, 7, add(at(layer, 1), im(sRe, sIm, at(state, 6), at(state, 7))));
    put(work, 8, scaled ? at(layer, 12) : both(1));
    put(work, 9, scaled ? at(layer, 13) : both(0));
    layer += 14 * V;
    state += 8 * V;
    work += 10 * V;
  }
}

/** X' = X M^-1 factor, with M and the factor in slots 0-7 and 8-9 of `work`. */
export function chainBack(pairs: i32, work: usize, workStride: usize, hasFactor: i32, chain: usize): void {
  for (let i = 0; i < pairs; i++) {
    const aRe = at(work, 0);
    const aIm = at(work, 1);
    const bRe = at(work, 2);
    const bIm = at(work, 3);
    const cRe = at(work, 4);
    const cIm = at(work, 5);
    const dRe = at(work, 6);
    const dIm = at(work, 7);
    const detRe = sub(re(aRe, aIm, dRe, dIm), re(bRe, bIm, cRe, cIm));
    const detIm = sub(im(aRe, aIm, dRe, dIm), im(bRe, bIm, cRe, cIm));
    const scale = inverseNorm(detRe, detIm);
    let invRe = mul(detRe, scale);
    let invIm = f64x2.neg(mul(detIm, scale));
    if (hasFactor) {
      const sameRe = invRe;
      invRe = re(sameRe, invIm, at(work, 8), at(work, 9));
      invIm = im(sameRe, invIm, at(work, 8), at(work, 9));
    }
    for (let row: usize = 0; row < 8; row += 4) {
      const x1Re = at(chain + row * V, 0);
      const x1Im = at(chain + row * V, 1);
      const x2Re = at(chain + row * V, 2);
      const x2Im = at(chain + row * V, 3);
      const lRe = sub(re(x1Re, x1Im, dRe, dIm), re(x2Re, x2Im, cRe, cIm));
      const lIm = sub(im(x1Re, x1Im, dRe, dIm), im(x2Re, x2Im, cRe, cIm));
      const rRe = sub(re(x2Re, x2Im, aRe, aIm), re(x1Re, x1Im, bRe, bIm));
      const rIm = sub(im(x2Re, x2Im, aRe, aIm), im(x1Re, x1Im, bRe, bIm));
      put(chain + row * V, 0, re(lRe, lIm, invRe, invIm));
      put(chain + row * V, 1, im(lRe, lIm, invRe, invIm));
      put(chain + row * V, 2, re(rRe, rIm, invRe, invIm));
      put(chain + row * V, 3, im(rRe, rIm, invRe, invIm));
    }
    work += workStride;
    chain += 8 * V;
  }
}
