import { angleOf, sineOfAngle, storeForwardRoot } from './functions.as';
import { add, at, both, choose, div, im, inverseNorm, mul, norm, put, re, sub, V } from './simd.as';

// Where light enters and leaves. Records (slots of one v128 each, see ../recordLayout.ts):
//   place    0 xi, 1 q0, 2 q0^2, 3 xi^2
//   light    0 k0 (1/nm), 1 N0
//   index    0-1 N, 2-3 Q
//   plain    0-1 eps, 2-3 1/eps, 4-5 eps - N0^2
//   state    0-7 Y: g = i Y f, with f = (Hy, Ey), g = (Ex, -Hx); order 11, 12, 21, 22
//   chain    0-7 X: f at the substrate = X f here
// A stride is in bytes from pair to pair; 0 where all points of the tile share one record.

/** Place of every pair from its angles in degrees (physics.md section 1). */
export function placePoints(pairs: i32, angles: usize, light: usize, lightStride: usize, place: usize): void {
  for (let i = 0; i < pairs; i++) {
    const angle = v128.load(angles);
    const n0 = at(light, 1);
    const degree = both(0.017453292519943295);
    const xi = mul(n0, sineOfAngle(mul(angle, degree)));
    // cos(theta) as sin(90 deg - theta): near grazing the subtraction in degrees is exact.
    const q0 = mul(n0, sineOfAngle(mul(sub(both(90), angle), degree)));
    put(place, 0, xi);
    put(place, 1, q0);
    put(place, 2, mul(q0, q0));
    put(place, 3, mul(xi, xi));
    angles += V;
    light += lightStride;
    place += 4 * V;
  }
}

/** Constants of a medium without gyration. */
export function preparePlain(pairs: i32, index: usize, light: usize, plain: usize): void {
  for (let i = 0; i < pairs; i++) {
    const nRe = at(index, 0);
    const nIm = at(index, 1);
    const n0 = at(light, 1);
    const epsRe = re(nRe, nIm, nRe, nIm);
    const epsIm = im(nRe, nIm, nRe, nIm);
    const scale = inverseNorm(epsRe, epsIm);
    put(plain, 0, epsRe);
    put(plain, 1, epsIm);
    put(plain, 2, mul(epsRe, scale));
    put(plain, 3, f64x2.neg(mul(epsIm, scale)));
    // (N - N0)(N + N0): nothing cancels in a layer that has the index of the incident medium.
    put(plain, 4, re(sub(nRe, n0), nIm, add(nRe, n0), nIm));
    put(plain, 5, im(sub(nRe, n0), nIm, add(nRe, n0), nIm));
    index += 4 * V;
    light += 2 * V;
    plain += 6 * V;
  }
}

/** Starts on a plain substrate: g = diag(q/eps, q) f, so Y = -i diag(q/eps, q). */
export function startPlain(pairs: i32, plain: usize, stride: usize, place: usize, state: usize): void {
  const zero = both(0);
  for (let i = 0; i < pairs; i++) {
    storeForwardRoot(state, add(at(plain, 4), at(place, 2)), at(plain, 5));
    const qRe = at(state, 0);
    const qIm = at(state, 1);
    put(state, 0, im(qRe, qIm, at(plain, 2), at(plain, 3)));
    put(state, 1, f64x2.neg(re(qRe, qIm, at(plain, 2), at(plain, 3))));
    put(state, 2, zero);
    put(state, 3, zero);
    put(state, 4, zero);
    put(state, 5, zero);
    put(state, 6, qIm);
    put(state, 7, f64x2.neg(qRe));
    plain += stride;
    place += 4 * V;
    state += 8 * V;
  }
}

export function startChain(pairs: i32, chain: usize): void {
  memory.fill(chain, 0, <usize>pairs * 8 * V);
  for (let i = 0; i < pairs; i++) {
    put(chain, 0, both(1));
    put(chain, 6, both(1));
    chain += 8 * V;
  }
}

/**
 * Into the incident medium: f = diag(N0, 1)(incident + reflected), g = diag(q0/N0, q0)(incident - reflected), so
 * r = D^-1 (Z0 - i Y)(Z0 + i Y)^-1 D with Z0 = diag(q0/N0^2, q0), D = diag(1/N0, 1). Written element by element:
 * r_ps and r_sp are products with Y12 and Y21, without any difference.
 *
 * Columns of `out`, each `column` bytes after the one before: r_pp, r_ps, r_sp, r_ss as re, im.
 * With `transmission`, 0-7 of each record receives (Z0 + i Y)^-1 D'.
 */
export function leave(
  pairs: i32,
  light: usize,
  lightStride: usize,
  place: usize,
  state: usize,
  out: usize,
  column: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const n0 = at(light, 1);
    const zs = at(place, 1);
    const zp = div(zs, mul(n0, n0));
    // A = Z0 + i Y
    const aRe = sub(zp, at(state, 1));
    const aIm = at(state, 0);
    const dRe = sub(zs, at(state, 7));
    const dIm = at(state, 6);
    const bRe = f64x2.neg(at(state, 3));
    const bIm = at(state, 2);
    const cRe = f64x2.neg(at(state, 5));
    const cIm = at(state, 4);
    const bcRe = re(bRe, bIm, cRe, cIm);
    const bcIm = im(bRe, bIm, cRe, cIm);
    const detRe = sub(re(aRe, aIm, dRe, dIm), bcRe);
    const detIm = sub(im(aRe, aIm, dRe, dIm), bcIm);
    const scale = inverseNorm(detRe, detIm);
    const invRe = mul(detRe, scale);
    const invIm = f64x2.neg(mul(detIm, scale));
    // (Z0 - i Y)11 = 2 zp - A11
    const apRe = sub(add(zp, zp), aRe);
    const asRe = sub(add(zs, zs), dRe);
    const ppRe = add(add(mul(apRe, dRe), mul(aIm, dIm)), bcRe);
    const ppIm = add(sub(mul(apRe, dIm), mul(aIm, dRe)), bcIm);
    const ssRe = add(add(mul(asRe, aRe), mul(dIm, aIm)), bcRe);
    const ssIm = add(sub(mul(asRe, aIm), mul(dIm, aRe)), bcIm);
    v128.store(out, re(ppRe, ppIm, invRe, invIm));
    v128.store(out + column, im(ppRe, ppIm, invRe, invIm));
    const ps = mul(mul(zp, n0), both(-2));
    v128.store(out + 2 * column, mul(ps, re(bRe, bIm, invRe, invIm)));
    v128.store(out + 3 * column, mul(ps, im(bRe, bIm, invRe, invIm)));
    const sp = div(mul(zs, both(-2)), n0);
    v128.store(out + 4 * column, mul(sp, re(cRe, cIm, invRe, invIm)));
    v128.store(out + 5 * column, mul(sp, im(cRe, cIm, invRe, invIm)));
    v128.store(out + 6 * column, re(ssRe, ssIm, invRe, invIm));
    v128.store(out + 7 * column, im(ssRe, ssIm, invRe, invIm));
    light += lightStride;
    place += 4 * V;
    state += 8 * V;
    out += V;
  }
}

/** One input: `p` is its first column of r, `first` its column of R, `angles` that of its rotation. */
@inline
function readInput(p: usize, column: usize, first: usize, angles: usize, sense: f64): void {
  const half = both(28.64788975654116);
  const pRe = v128.load(p);
  const pIm = v128.load(p + column);
  const sRe = v128.load(p + 4 * column);
  const sIm = v128.load(p + 5 * column);
  const powerP = norm(pRe, pIm);
  const powerS = norm(sRe, sIm);
  const s0 = add(powerP, powerS);
  v128.store(first, s0);
  const s1 = sub(powerP, powerS);
  const s2 = mul(both(2), add(mul(pRe, sRe), mul(pIm, sIm)));
  const s3 = mul(both(2), sub(mul(pRe, sIm), mul(pIm, sRe)));
  const none = v128.or(f64x2.lt(s0, both(1e-28)), f64x2.ne(s0, s0));
  let rotation = mul(half, angleOf(mul(both(sense), s2), mul(both(sense), s1)));
  rotation = choose(f64x2.le(rotation, both(-90)), add(rotation, both(180)), rotation);
  const ellipticity = mul(half, angleOf(s3, f64x2.sqrt(norm(s1, s2))));
  v128.store(angles, v128.or(rotation, none));
  v128.store(angles + column, v128.or(ellipticity, none));
}

/**
 * R and the exact Kerr angles (physics.md section 4) from the eight columns of `leave`: columns 8 R_p, 9 R_s,
 * 10 rotation and 11 ellipticity for p light, 12 and 13 for s light, deg; NaN where S0 < 1e-28.
 */
export function readAngles(pairs: i32, out: usize, column: usize): void {
  for (let i = 0; i < pairs; i++) {
    readInput(out, column, out + 8 * column, out + 10 * column, 1);
    readInput(out + 2 * column, column, out + 9 * column, out + 12 * column, -1);
    out += V;
  }
}

/**
 * Energy and amplitudes behind the last interface. x = X (Z0 + i Y)^-1 diag(2 q0/N0, 2 q0) is f at the substrate for
 * unit p (first column) and s light; T = Re(f* g)/q0 with g = i Y_sub f. Columns 14 T_p, 15 T_s; 16-23 t_pp, t_ps,
 * t_sp, t_ss where the substrate is plain (`index` is its record): Hy = N t_p, Ey = t_s.
 */
export function transmit(
  pairs: i32,
  light: usize,
  lightStride: usize,
  place: usize,
  state: usize,
  chain: usize,
  substrate: usize,
  index: usize,
  indexStride: usize,
  out: usize,
  column: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const n0 = at(light, 1);
    const zs = at(place, 1);
    const zp = div(zs, mul(n0, n0));
    const aRe = sub(zp, at(state, 1));
    const aIm = at(state, 0);
    const dRe = sub(zs, at(state, 7));
    const dIm = at(state, 6);
    const bRe = f64x2.neg(at(state, 3));
    const bIm = at(state, 2);
    const cRe = f64x2.neg(at(state, 5));
    const cIm = at(state, 4);
    const detRe = sub(re(aRe, aIm, dRe, dIm), re(bRe, bIm, cRe, cIm));
    const detIm = sub(im(aRe, aIm, dRe, dIm), im(bRe, bIm, cRe, cIm));
    const scale = inverseNorm(detRe, detIm);
    const invRe = mul(detRe, scale);
    const invIm = f64x2.neg(mul(detIm, scale));
    const nRe = at(index, 0);
    const nIm = at(index, 1);
    const perIndex = inverseNorm(nRe, nIm);
    const unRe = mul(nRe, perIndex);
    const unIm = f64x2.neg(mul(nIm, perIndex));
    for (let input: usize = 0; input < 2; input++) {
      // Column of the inverse: (d, -c) / det for p light, (-b, a) / det for s light.
      const uRe = input === 0 ? dRe : f64x2.neg(bRe);
      const uIm = input === 0 ? dIm : f64x2.neg(bIm);
      const vRe = input === 0 ? f64x2.neg(cRe) : aRe;
      const vIm = input === 0 ? f64x2.neg(cIm) : aIm;
      const factor = mul(both(2), input === 0 ? div(zs, n0) : zs);
      const fRe = mul(factor, invRe);
      const fIm = mul(factor, invIm);
      const x1Re = re(uRe, uIm, fRe, fIm);
      const x1Im = im(uRe, uIm, fRe, fIm);
      const x2Re = re(vRe, vIm, fRe, fIm);
      const x2Im = im(vRe, vIm, fRe, fIm);
      const hRe = add(re(at(chain, 0), at(chain, 1), x1Re, x1Im), re(at(chain, 2), at(chain, 3), x2Re, x2Im));
      const hIm = add(im(at(chain, 0), at(chain, 1), x1Re, x1Im), im(at(chain, 2), at(chain, 3), x2Re, x2Im));
      const eRe = add(re(at(chain, 4), at(chain, 5), x1Re, x1Im), re(at(chain, 6), at(chain, 7), x2Re, x2Im));
      const eIm = add(im(at(chain, 4), at(chain, 5), x1Re, x1Im), im(at(chain, 6), at(chain, 7), x2Re, x2Im));
      // Y f; Re(conj(f) i Y f) = -Im(conj(f) Y f)
      const y1Re = add(re(at(substrate, 0), at(substrate, 1), hRe, hIm), re(at(substrate, 2), at(substrate, 3), eRe, eIm));
      const y1Im = add(im(at(substrate, 0), at(substrate, 1), hRe, hIm), im(at(substrate, 2), at(substrate, 3), eRe, eIm));
      const y2Re = add(re(at(substrate, 4), at(substrate, 5), hRe, hIm), re(at(substrate, 6), at(substrate, 7), eRe, eIm));
      const y2Im = add(im(at(substrate, 4), at(substrate, 5), hRe, hIm), im(at(substrate, 6), at(substrate, 7), eRe, eIm));
      const flux = add(
        sub(mul(hIm, y1Re), mul(hRe, y1Im)),
        sub(mul(eIm, y2Re), mul(eRe, y2Im)),
      );
      v128.store(out + (14 + input) * column, div(flux, zs));
      const t = out + (16 + 2 * input) * column;
      v128.store(t, re(hRe, hIm, unRe, unIm));
      v128.store(t + column, im(hRe, hIm, unRe, unIm));
      v128.store(t + 4 * column, eRe);
      v128.store(t + 5 * column, eIm);
    }
    light += lightStride;
    place += 4 * V;
    state += 8 * V;
    chain += 8 * V;
    substrate += 8 * V;
    index += indexStride;
    out += V;
  }
}
