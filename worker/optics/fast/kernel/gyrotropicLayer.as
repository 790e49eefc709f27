import { settle } from './block.as';
import { add, at, both, entry, im, mul, put, re, sub, V } from './simd.as';

// Layers of a gyrotropic medium (gyrotropicMedium.as). K = [0, 1; -V, U] acts on (f, lambda f); a layer is
// exp(k0 d K), found as a polynomial of degree 3 in K modulo its characteristic polynomial. No wave is followed on
// its own, so nothing happens where two of them coincide, at whatever Q.
//   series   0-7 alpha, beta, gamma, delta of exp(k0 d K) = alpha + beta K + gamma K^2 + delta K^3
//   map      0-7 E11, 8-15 E12 of exp(k0 d K) = [E11, E12; -E12 V, E11 + E12 U], 16-23 V, 24-25 xi Q my

/** 1 / n! */
const SERIES: usize = memory.data<f64>([
  1.0, 1.0, 0.5, 1.6666666666666666e-1, 4.1666666666666664e-2, 8.333333333333333e-3, 1.388888888888889e-3,
  1.984126984126984e-4, 2.48015873015873e-5, 2.7557319223985893e-6, 2.755731922398589e-7,
  2.505210838544172e-8, 2.08767569878681e-9, 1.6059043836821613e-10, 1.1470745597729725e-11,
  7.647163731819816e-13, 4.779477332387385e-14, 2.8114572543455206e-15, 1.5619206968586225e-16,
  8.22063524662433e-18, 4.110317623312165e-19, 1.9572941063391263e-20, 8.896791392450574e-22,
  3.868170170630684e-23, 1.6117375710961184e-24,
]);

/**
 * The series by Horner's rule modulo L^4 + p2 L^2 + p1 L + p0, then squared `doublings` times.
 *
 * @param phase k0, phaseStride apart; times `thickness` it is the k0 d of the series, before doubling
 * @param degree last power, odd, >= 5
 * @param even p1 = 0 at every pair (mx mz = 0): even and odd powers then part, with half the products
 */
export function traceGyrotropic(
  pairs: i32,
  gyro: usize,
  stride: usize,
  place: usize,
  phase: usize,
  phaseStride: usize,
  thickness: f64,
  degree: usize,
  doublings: i32,
  even: i32,
  series: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const k0d = mul(v128.load(phase), both(thickness));
    const k2 = mul(k0d, k0d);
    const xi = at(place, 0);
    const eRe = add(at(gyro, 0), at(place, 2));
    const eIm = at(gyro, 1);
    const p2Re = mul(k2, add(add(eRe, eRe), at(gyro, 22)));
    const p2Im = mul(k2, add(add(eIm, eIm), at(gyro, 23)));
    const k4 = mul(k2, k2);
    const sRe = sub(eRe, at(gyro, 26));
    const sIm = sub(eIm, at(gyro, 27));
    const xi2 = at(place, 3);
    const p0Re = mul(k4, sub(re(eRe, eIm, sRe, sIm), mul(xi2, at(gyro, 28))));
    const p0Im = mul(k4, sub(im(eRe, eIm, sRe, sIm), mul(xi2, at(gyro, 29))));
    let aIm = both(0);
    let bIm = both(0);
    let cIm = both(0);
    let dIm = both(0);
    let aRe = entry(SERIES, degree - 3);
    let bRe = entry(SERIES, degree - 2);
    let cRe = entry(SERIES, degree - 1);
    let dRe = entry(SERIES, degree);
    if (even) {
      // Signed: the count passes below zero.
      for (let k = <isize>degree - 4; k > 0; k -= 2) {
        // (a + c L^2) L^2 + 1/(k-1)!, and the same of (b + d L^2) with 1/k!
        const tRe = sub(aRe, re(cRe, cIm, p2Re, p2Im));
        const tIm = sub(aIm, im(cRe, cIm, p2Re, p2Im));
        aRe = sub(entry(SERIES, <usize>k - 1), re(cRe, cIm, p0Re, p0Im));
        aIm = f64x2.neg(im(cRe, cIm, p0Re, p0Im));
        cRe = tRe;
        cIm = tIm;
        const uRe = sub(bRe, re(dRe, dIm, p2Re, p2Im));
        const uIm = sub(bIm, im(dRe, dIm, p2Re, p2Im));
        bRe = sub(entry(SERIES, <usize>k), re(dRe, dIm, p0Re, p0Im));
        bIm = f64x2.neg(im(dRe, dIm, p0Re, p0Im));
        dRe = uRe;
        dIm = uIm;
      }
    } else {
      const k3 = mul(k2, mul(k0d, xi));
      const p1Re = mul(k3, at(gyro, 24));
      const p1Im = mul(k3, at(gyro, 25));
      for (let k = degree - 3; k > 0; k--) {
        const tRe = sub(bRe, re(dRe, dIm, p2Re, p2Im));
        const tIm = sub(bIm, im(dRe, dIm, p2Re, p2Im));
        bRe = sub(aRe, re(dRe, dIm, p1Re, p1Im));
        bIm = sub(aIm, im(dRe, dIm, p1Re, p1Im));
        aRe = sub(entry(SERIES, k - 1), re(dRe, dIm, p0Re, p0Im));
        aIm = f64x2.neg(im(dRe, dIm, p0Re, p0Im));
        dRe = cRe;
        dIm = cIm;
        cRe = tRe;
        cIm = tIm;
      }
    }
    put(series, 0, aRe);
    put(series, 1, aIm);
    put(series, 2, bRe);
    put(series, 3, bIm);
    put(series, 4, cRe);
    put(series, 5, cIm);
    put(series, 6, dRe);
    put(series, 7, dIm);
    if (doublings > 0) {
      const k3 = mul(k2, mul(k0d, xi));
      for (let k = 0; k < doublings; k++) {
        square(series, p2Re, p2Im, mul(k3, at(gyro, 24)), mul(k3, at(gyro, 25)), p0Re, p0Im);
      }
    }
    // From powers of k0 d K to powers of K.
    const k3 = mul(k2, k0d);
    put(series, 2, mul(at(series, 2), k0d));
    put(series, 3, mul(at(series, 3), k0d));
    put(series, 4, mul(at(series, 4), k2));
    put(series, 5, mul(at(series, 5), k2));
    put(series, 6, mul(at(series, 6), k3));
    put(series, 7, mul(at(series, 7), k3));
    gyro += stride;
    place += 4 * V;
    phase += phaseStride;
    series += 8 * V;
  }
}

/** (alpha + beta L + gamma L^2 + delta L^3)^2 modulo the characteristic polynomial, in place. */
function square(
  series: usize,
  p2Re: v128,
  p2Im: v128,
  p1Re: v128,
  p1Im: v128,
  p0Re: v128,
  p0Im: v128,
): void {
  const two = both(2);
  const aRe = at(series, 0);
  const aIm = at(series, 1);
  const bRe = at(series, 2);
  const bIm = at(series, 3);
  const cRe = at(series, 4);
  const cIm = at(series, 5);
  const dRe = at(series, 6);
  const dIm = at(series, 7);
  // Coefficients of L^6 and L^5, then downward, each reduced by L^4 = -(p2 L^2 + p1 L + p0).
  const s6Re = re(dRe, dIm, dRe, dIm);
  const s6Im = im(dRe, dIm, dRe, dIm);
  const s5Re = mul(two, re(cRe, cIm, dRe, dIm));
  const s5Im = mul(two, im(cRe, cIm, dRe, dIm));
  const s4Re = sub(
    add(mul(two, re(bRe, bIm, dRe, dIm)), re(cRe, cIm, cRe, cIm)),
    re(p2Re, p2Im, s6Re, s6Im),
  );
  const s4Im = sub(
    add(mul(two, im(bRe, bIm, dRe, dIm)), im(cRe, cIm, cRe, cIm)),
    im(p2Re, p2Im, s6Re, s6Im),
  );
  const s3Re = mul(two, add(re(aRe, aIm, dRe, dIm), re(bRe, bIm, cRe, cIm)));
  const s3Im = mul(two, add(im(aRe, aIm, dRe, dIm), im(bRe, bIm, cRe, cIm)));
  put(series, 6, sub(s3Re, add(re(p1Re, p1Im, s6Re, s6Im), re(p2Re, p2Im, s5Re, s5Im))));
  put(series, 7, sub(s3Im, add(im(p1Re, p1Im, s6Re, s6Im), im(p2Re, p2Im, s5Re, s5Im))));
  const s2Re = add(mul(two, re(aRe, aIm, cRe, cIm)), re(bRe, bIm, bRe, bIm));
  const s2Im = add(mul(two, im(aRe, aIm, cRe, cIm)), im(bRe, bIm, bRe, bIm));
  const l2Re = add(re(p0Re, p0Im, s6Re, s6Im), re(p1Re, p1Im, s5Re, s5Im));
  const l2Im = add(im(p0Re, p0Im, s6Re, s6Im), im(p1Re, p1Im, s5Re, s5Im));
  put(series, 4, sub(s2Re, add(l2Re, re(p2Re, p2Im, s4Re, s4Im))));
  put(series, 5, sub(s2Im, add(l2Im, im(p2Re, p2Im, s4Re, s4Im))));
  const l1Re = add(re(p0Re, p0Im, s5Re, s5Im), re(p1Re, p1Im, s4Re, s4Im));
  const l1Im = add(im(p0Re, p0Im, s5Re, s5Im), im(p1Re, p1Im, s4Re, s4Im));
  put(series, 2, sub(mul(two, re(aRe, aIm, bRe, bIm)), l1Re));
  put(series, 3, sub(mul(two, im(aRe, aIm, bRe, bIm)), l1Im));
  put(series, 0, sub(re(aRe, aIm, aRe, aIm), re(p0Re, p0Im, s4Re, s4Im)));
  put(series, 1, sub(im(aRe, aIm, aRe, aIm), im(p0Re, p0Im, s4Re, s4Im)));
}

/**
 * E11 = alpha - (gamma + delta U) V and E12 = beta + delta u12 u21 + gamma U - delta V; U^2 is the scalar u12 u21.
 */
export function mapGyrotropic(
  pairs: i32,
  gyro: usize,
  stride: usize,
  place: usize,
  series: usize,
  map: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const xi = at(place, 0);
    const eRe = add(at(gyro, 0), at(place, 2));
    const eIm = at(gyro, 1);
    const v11Re = add(eRe, at(gyro, 18));
    const v11Im = add(eIm, at(gyro, 19));
    const v12Re = mul(xi, at(gyro, 14));
    const v12Im = mul(xi, at(gyro, 15));
    const v21Re = mul(xi, at(gyro, 16));
    const v21Im = mul(xi, at(gyro, 17));
    const v22Re = add(eRe, at(gyro, 20));
    const v22Im = add(eIm, at(gyro, 21));
    put(map, 16, v11Re);
    put(map, 17, v11Im);
    put(map, 18, v12Re);
    put(map, 19, v12Im);
    put(map, 20, v21Re);
    put(map, 21, v21Im);
    put(map, 22, v22Re);
    put(map, 23, v22Im);
    put(map, 24, mul(xi, at(gyro, 12)));
    put(map, 25, mul(xi, at(gyro, 13)));
    const dRe = at(series, 6);
    const dIm = at(series, 7);
    const u12Re = at(gyro, 6);
    const u12Im = at(gyro, 7);
    const u21Re = at(gyro, 8);
    const u21Im = at(gyro, 9);
    const d12Re = re(dRe, dIm, u12Re, u12Im);
    const d12Im = im(dRe, dIm, u12Re, u12Im);
    const d21Re = re(dRe, dIm, u21Re, u21Im);
    const d21Im = im(dRe, dIm, u21Re, u21Im);
    const cRe = at(series, 4);
    const cIm = at(series, 5);
    put(map, 0, sub(at(series, 0), add(re(cRe, cIm, v11Re, v11Im), re(d12Re, d12Im, v21Re, v21Im))));
    put(map, 1, sub(at(series, 1), add(im(cRe, cIm, v11Re, v11Im), im(d12Re, d12Im, v21Re, v21Im))));
    put(map, 2, f64x2.neg(add(re(cRe, cIm, v12Re, v12Im), re(d12Re, d12Im, v22Re, v22Im))));
    put(map, 3, f64x2.neg(add(im(cRe, cIm, v12Re, v12Im), im(d12Re, d12Im, v22Re, v22Im))));
    put(map, 4, f64x2.neg(add(re(cRe, cIm, v21Re, v21Im), re(d21Re, d21Im, v11Re, v11Im))));
    put(map, 5, f64x2.neg(add(im(cRe, cIm, v21Re, v21Im), im(d21Re, d21Im, v11Re, v11Im))));
    put(map, 6, sub(at(series, 0), add(re(cRe, cIm, v22Re, v22Im), re(d21Re, d21Im, v12Re, v12Im))));
    put(map, 7, sub(at(series, 1), add(im(cRe, cIm, v22Re, v22Im), im(d21Re, d21Im, v12Re, v12Im))));
    const tRe = add(at(series, 2), re(dRe, dIm, at(gyro, 10), at(gyro, 11)));
    const tIm = add(at(series, 3), im(dRe, dIm, at(gyro, 10), at(gyro, 11)));
    put(map, 8, sub(tRe, re(dRe, dIm, v11Re, v11Im)));
    put(map, 9, sub(tIm, im(dRe, dIm, v11Re, v11Im)));
    put(map, 10, sub(re(cRe, cIm, u12Re, u12Im), re(dRe, dIm, v12Re, v12Im)));
    put(map, 11, sub(im(cRe, cIm, u12Re, u12Im), im(dRe, dIm, v12Re, v12Im)));
    put(map, 12, sub(re(cRe, cIm, u21Re, u21Im), re(dRe, dIm, v21Re, v21Im)));
    put(map, 13, sub(im(cRe, cIm, u21Re, u21Im), im(dRe, dIm, v21Re, v21Im)));
    put(map, 14, sub(tRe, re(dRe, dIm, v22Re, v22Im)));
    put(map, 15, sub(tIm, im(dRe, dIm, v22Re, v22Im)));
    gyro += stride;
    place += 4 * V;
    series += 8 * V;
    map += 26 * V;
  }
}

/** One row of M and of lambda f in one column: E11 + E12 W and E11 W + E12 X. */
@inline
function crossRow(
  map: usize,
  work: usize,
  column: usize,
  w1Re: v128,
  w1Im: v128,
  w2Re: v128,
  w2Im: v128,
  x1Re: v128,
  x1Im: v128,
  x2Re: v128,
  x2Im: v128,
): void {
  const f1Re = at(map, 8);
  const f1Im = at(map, 9);
  const f2Re = at(map, 10);
  const f2Im = at(map, 11);
  put(work, column, add(at(map, column), add(re(f1Re, f1Im, w1Re, w1Im), re(f2Re, f2Im, w2Re, w2Im))));
  put(
    work,
    column + 1,
    add(at(map, column + 1), add(im(f1Re, f1Im, w1Re, w1Im), im(f2Re, f2Im, w2Re, w2Im))),
  );
  const sRe = add(re(f1Re, f1Im, x1Re, x1Im), re(f2Re, f2Im, x2Re, x2Im));
  const sIm = add(im(f1Re, f1Im, x1Re, x1Im), im(f2Re, f2Im, x2Re, x2Im));
  const e1Re = at(map, 0);
  const e1Im = at(map, 1);
  const e2Re = at(map, 2);
  const e2Im = at(map, 3);
  put(work, 8 + column, add(sRe, add(re(e1Re, e1Im, w1Re, w1Im), re(e2Re, e2Im, w2Re, w2Im))));
  put(work, 9 + column, add(sIm, add(im(e1Re, e1Im, w1Re, w1Im), im(e2Re, e2Im, w2Re, w2Im))));
}

/** One column of a crossing; `aRe`, `aIm` is A in that column. */
@inline
function crossColumn(
  gyro: usize,
  map: usize,
  state: usize,
  work: usize,
  column: usize,
  aRe: v128,
  aIm: v128,
): void {
  const kRe = at(gyro, 2);
  const kIm = at(gyro, 3);
  const y1Re = at(state, column);
  const y1Im = at(state, column + 1);
  const w1Re = add(re(kRe, kIm, y1Re, y1Im), aRe);
  const w1Im = add(im(kRe, kIm, y1Re, y1Im), aIm);
  const w2Re = at(state, column + 4);
  const w2Im = at(state, column + 5);
  const u12Re = at(gyro, 6);
  const u12Im = at(gyro, 7);
  const x1Re = sub(re(u12Re, u12Im, w2Re, w2Im), at(map, 16 + column));
  const x1Im = sub(im(u12Re, u12Im, w2Re, w2Im), at(map, 17 + column));
  const u21Re = at(gyro, 8);
  const u21Im = at(gyro, 9);
  const x2Re = sub(re(u21Re, u21Im, w1Re, w1Im), at(map, 20 + column));
  const x2Im = sub(im(u21Re, u21Im, w1Re, w1Im), at(map, 21 + column));
  crossRow(map, work, column, w1Re, w1Im, w2Re, w2Im, x1Re, x1Im, x2Re, x2Im);
  crossRow(map + 4 * V, work + 4 * V, column, w1Re, w1Im, w2Re, w2Im, x1Re, x1Im, x2Re, x2Im);
}

/**
 * First half of a crossing: with W = A + B Y the lambda f of Y, X = U W - V, the fields above are
 * M = E11 + E12 W and lambda f = E11 W + E12 X. Both go to `work` (0-7 and 8-15).
 */
export function crossGyrotropic(
  pairs: i32,
  gyro: usize,
  stride: usize,
  map: usize,
  state: usize,
  work: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    crossColumn(gyro, map, state, work, 0, at(map, 24), at(map, 25));
    crossColumn(gyro, map, state, work, 2, at(gyro, 6), at(gyro, 7));
    gyro += stride;
    map += 26 * V;
    state += 8 * V;
    work += 16 * V;
  }
}

/** Second half: Y' = B^-1 ((lambda f) M^-1 - A). */
export function settleGyrotropic(
  pairs: i32,
  gyro: usize,
  stride: usize,
  map: usize,
  work: usize,
  state: usize,
): void {
  settle(pairs, work, state);
  for (let i = 0; i < pairs; i++) {
    const kappaRe = at(gyro, 4);
    const kappaIm = at(gyro, 5);
    const y1Re = sub(at(state, 0), at(map, 24));
    const y1Im = sub(at(state, 1), at(map, 25));
    put(state, 0, re(y1Re, y1Im, kappaRe, kappaIm));
    put(state, 1, im(y1Re, y1Im, kappaRe, kappaIm));
    const y2Re = sub(at(state, 2), at(gyro, 6));
    const y2Im = sub(at(state, 3), at(gyro, 7));
    put(state, 2, re(y2Re, y2Im, kappaRe, kappaIm));
    put(state, 3, im(y2Re, y2Im, kappaRe, kappaIm));
    gyro += stride;
    map += 26 * V;
    state += 8 * V;
  }
}
