import { storeForwardRoot } from './functions.as';
import { add, at, both, choose, div, im, inverseNorm, mul, norm, put, re, sub, V } from './simd.as';

// A medium of scalar eps_d with gyration Q m (physics.md sections 2 and 3). In it f = (Hy, Ey) with
// f = exp(lambda z'), z' = -k0 z, obeys lambda^2 f = lambda U f - V f (waveEquation.ts with u = i lambda):
//   U = [0, u12; u21, 0],   u12 = eps (Q mz - i Q^2 mx my),   u21 = -eps (Q mz + i Q^2 mx my)/kappa
//   V11 = E - Q^2 eps my^2,                    V12 = xi Q (i kappa mx - my u12)
//   V21 = xi Q (my u21 - i mx),                V22 = E + u12 u21 - Q^2 eps mx^2
//   E = eps - xi^2,  kappa = eps (1 - Q^2 my^2)
// and lambda f = A f + B h (g = i h), A = [xi Q my, u12; 0, 0], B = diag(kappa, 1). The four lambda are the roots of
// L^4 + p2 L^2 + p1 L + p0, the quartic of physics.md section 3:
//   p2 = 2 E - Q^2 eps (mx^2 + my^2),  p1 = -2 i Q^2 eps mx mz xi,  p0 = E^2 - E Q^2 eps |m|^2 - Q^2 eps mx^2 xi^2
//   gyro     0-1 eps - N0^2, 2-3 kappa, 4-5 1/kappa, 6-7 u12, 8-9 u21, 10-11 u12 u21, 12-13 Q my, 14-15 V12/xi,
//            16-17 V21/xi, 18-19 V11 - E, 20-21 V22 - E, 22-23 p2 - 2 E, 24-25 p1/xi, 26-27 Q^2 eps |m|^2,
//            28-29 Q^2 eps mx^2

/** Constants of a medium, from N and Q at each pair's wavelength. */
export function prepareGyrotropic(
  pairs: i32,
  index: usize,
  light: usize,
  mx: f64,
  my: f64,
  mz: f64,
  gyro: usize,
): void {
  const xy = both(mx * my);
  for (let i = 0; i < pairs; i++) {
    const nRe = at(index, 0);
    const nIm = at(index, 1);
    const qRe = at(index, 2);
    const qIm = at(index, 3);
    const n0 = at(light, 1);
    const epsRe = re(nRe, nIm, nRe, nIm);
    const epsIm = im(nRe, nIm, nRe, nIm);
    const vRe = re(epsRe, epsIm, qRe, qIm);
    const vIm = im(epsRe, epsIm, qRe, qIm);
    // Q^2 eps
    const wRe = re(vRe, vIm, qRe, qIm);
    const wIm = im(vRe, vIm, qRe, qIm);
    put(gyro, 0, re(sub(nRe, n0), nIm, add(nRe, n0), nIm));
    put(gyro, 1, im(sub(nRe, n0), nIm, add(nRe, n0), nIm));
    const kRe = sub(epsRe, mul(wRe, both(my * my)));
    const kIm = sub(epsIm, mul(wIm, both(my * my)));
    put(gyro, 2, kRe);
    put(gyro, 3, kIm);
    const scale = inverseNorm(kRe, kIm);
    const pRe = mul(kRe, scale);
    const pIm = f64x2.neg(mul(kIm, scale));
    put(gyro, 4, pRe);
    put(gyro, 5, pIm);
    const u12Re = add(mul(vRe, both(mz)), mul(wIm, xy));
    const u12Im = sub(mul(vIm, both(mz)), mul(wRe, xy));
    put(gyro, 6, u12Re);
    put(gyro, 7, u12Im);
    const xRe = sub(mul(wIm, xy), mul(vRe, both(mz)));
    const xIm = f64x2.neg(add(mul(vIm, both(mz)), mul(wRe, xy)));
    const u21Re = re(xRe, xIm, pRe, pIm);
    const u21Im = im(xRe, xIm, pRe, pIm);
    put(gyro, 8, u21Re);
    put(gyro, 9, u21Im);
    const tRe = re(u12Re, u12Im, u21Re, u21Im);
    const tIm = im(u12Re, u12Im, u21Re, u21Im);
    put(gyro, 10, tRe);
    put(gyro, 11, tIm);
    put(gyro, 12, mul(qRe, both(my)));
    put(gyro, 13, mul(qIm, both(my)));
    const aRe = f64x2.neg(add(mul(kIm, both(mx)), mul(u12Re, both(my))));
    const aIm = sub(mul(kRe, both(mx)), mul(u12Im, both(my)));
    put(gyro, 14, re(aRe, aIm, qRe, qIm));
    put(gyro, 15, im(aRe, aIm, qRe, qIm));
    const bRe = mul(u21Re, both(my));
    const bIm = sub(mul(u21Im, both(my)), both(mx));
    put(gyro, 16, re(bRe, bIm, qRe, qIm));
    put(gyro, 17, im(bRe, bIm, qRe, qIm));
    put(gyro, 18, mul(wRe, both(-my * my)));
    put(gyro, 19, mul(wIm, both(-my * my)));
    put(gyro, 20, sub(tRe, mul(wRe, both(mx * mx))));
    put(gyro, 21, sub(tIm, mul(wIm, both(mx * mx))));
    put(gyro, 22, mul(wRe, both(-(mx * mx + my * my))));
    put(gyro, 23, mul(wIm, both(-(mx * mx + my * my))));
    put(gyro, 24, mul(wIm, both(2 * mx * mz)));
    put(gyro, 25, mul(wRe, both(-2 * mx * mz)));
    put(gyro, 26, mul(wRe, both(mx * mx + my * my + mz * mz)));
    put(gyro, 27, mul(wIm, both(mx * mx + my * my + mz * mz)));
    put(gyro, 28, mul(wRe, both(mx * mx)));
    put(gyro, 29, mul(wIm, both(mx * mx)));
    index += 4 * V;
    light += 2 * V;
    gyro += 30 * V;
  }
}

/**
 * Starts on a magnetic substrate. The quartic in u = i lambda has no cubic term, so it is
 * (u^2 - a u + b)(u^2 + a u + c) with a the sum and b the product of the two forward wave numbers:
 * a (b - c) = c1, b + c = c2 + a^2, b c = c0. With y = a^2 that is (y + c2)^2 = 4 c0 + c1^2/y, solved by Newton from
 * c1 = 0 (c1^2 is of fourth order in Q). Then P = (a - U')^-1 (b - V') for the pair and g = Z f (`fillBeam` of
 * modes.ts), U' and V' being those of waveEquation.ts: U' = i U, V' = -V.
 *
 * `doubtful` receives all ones in a lane where the start is too far off to trust (near a critical angle, or with a
 * gyration as large as the permittivity); such points are for the general solver.
 */
export function startGyrotropic(
  pairs: i32,
  gyro: usize,
  stride: usize,
  place: usize,
  state: usize,
  doubtful: usize,
): void {
  for (let i = 0; i < pairs; i++) {
    const xi = at(place, 0);
    const xi2 = at(place, 3);
    const eRe = add(at(gyro, 0), at(place, 2));
    const eIm = at(gyro, 1);
    const p2Re = add(add(eRe, eRe), at(gyro, 22));
    const p2Im = add(add(eIm, eIm), at(gyro, 23));
    // 4 c0, and c1^2 = -p1^2
    const sRe = sub(eRe, at(gyro, 26));
    const sIm = sub(eIm, at(gyro, 27));
    const c0Re = mul(both(4), sub(re(eRe, eIm, sRe, sIm), mul(xi2, at(gyro, 28))));
    const c0Im = mul(both(4), sub(im(eRe, eIm, sRe, sIm), mul(xi2, at(gyro, 29))));
    const p1Re = mul(xi, at(gyro, 24));
    const p1Im = mul(xi, at(gyro, 25));
    const c1Re = f64x2.neg(re(p1Re, p1Im, p1Re, p1Im));
    const c1Im = f64x2.neg(im(p1Re, p1Im, p1Re, p1Im));
    // y + c2 = 2 E sqrt(c0/E^2), the root near 2 E
    const ee = mul(both(0.25), inverseNorm(eRe, eIm));
    const rRe = mul(ee, add(mul(c0Re, eRe), mul(c0Im, eIm)));
    const rIm = mul(ee, sub(mul(c0Im, eRe), mul(c0Re, eIm)));
    // c0/E, then c0/E^2 = 1 - small
    const ratioRe = mul(mul(both(4), ee), add(mul(rRe, eRe), mul(rIm, eIm)));
    const ratioIm = mul(mul(both(4), ee), sub(mul(rIm, eRe), mul(rRe, eIm)));
    storeForwardRoot(state, ratioRe, ratioIm);
    const twiceRe = add(eRe, eRe);
    const twiceIm = add(eIm, eIm);
    let fRe = re(at(state, 0), at(state, 1), twiceRe, twiceIm);
    let fIm = im(at(state, 0), at(state, 1), twiceRe, twiceIm);
    let bad = f64x2.gt(norm(sub(ratioRe, both(1)), ratioIm), both(0.09));
    let step = both(1);
    for (let k = 0; k < 3; k++) {
      // F = f^2 - 4 c0 - c1^2/y, F' = 2 f + c1^2/y^2, y = f - c2 = f + p2
      const yRe = add(fRe, p2Re);
      const yIm = add(fIm, p2Im);
      const yy = inverseNorm(yRe, yIm);
      const gRe = mul(yy, add(mul(c1Re, yRe), mul(c1Im, yIm)));
      const gIm = mul(yy, sub(mul(c1Im, yRe), mul(c1Re, yIm)));
      const hRe = mul(yy, add(mul(gRe, yRe), mul(gIm, yIm)));
      const hIm = mul(yy, sub(mul(gIm, yRe), mul(gRe, yIm)));
      const vRe = sub(sub(re(fRe, fIm, fRe, fIm), c0Re), gRe);
      const vIm = sub(sub(im(fRe, fIm, fRe, fIm), c0Im), gIm);
      const dRe = add(add(fRe, fRe), hRe);
      const dIm = add(add(fIm, fIm), hIm);
      const dd = inverseNorm(dRe, dIm);
      const stepRe = mul(dd, add(mul(vRe, dRe), mul(vIm, dIm)));
      const stepIm = mul(dd, sub(mul(vIm, dRe), mul(vRe, dIm)));
      fRe = sub(fRe, stepRe);
      fIm = sub(fIm, stepIm);
      step = norm(stepRe, stepIm);
    }
    const yRe = add(fRe, p2Re);
    const yIm = add(fIm, p2Im);
    const size = norm(yRe, yIm);
    // Not converged, or a^2 so small against what it is the difference of that its digits are gone.
    bad = v128.or(bad, f64x2.gt(step, mul(both(1e-26), size)));
    bad = v128.or(bad, f64x2.lt(mul(size, both(1e4)), norm(at(gyro, 26), at(gyro, 27))));
    bad = v128.or(bad, f64x2.ne(size, size));
    v128.store(doubtful, bad);
    storeForwardRoot(state, yRe, yIm);
    const aRe = at(state, 0);
    const aIm = at(state, 1);
    // b = (f + c1/a)/2 with f = b + c; c1 = -i p1
    const aa = inverseNorm(aRe, aIm);
    const qRe = mul(aa, sub(mul(p1Im, aRe), mul(p1Re, aIm)));
    const qIm = f64x2.neg(mul(aa, add(mul(p1Re, aRe), mul(p1Im, aIm))));
    const bRe = mul(both(0.5), add(fRe, qRe));
    const bIm = mul(both(0.5), add(fIm, qIm));
    // U' = i U, V' = -V, U'12 U'21 = -u12 u21; det = a^2 - U'12 U'21
    const u12Re = at(gyro, 6);
    const u12Im = at(gyro, 7);
    const u21Re = at(gyro, 8);
    const u21Im = at(gyro, 9);
    const v12Re = mul(xi, at(gyro, 14));
    const v12Im = mul(xi, at(gyro, 15));
    const v21Re = mul(xi, at(gyro, 16));
    const v21Im = mul(xi, at(gyro, 17));
    const detRe = add(yRe, at(gyro, 10));
    const detIm = add(yIm, at(gyro, 11));
    const dd = inverseNorm(detRe, detIm);
    const invRe = mul(detRe, dd);
    const invIm = f64x2.neg(mul(detIm, dd));
    // b - V'11 and b - V'22, their difference V'22 - V'11 = V11 - V22
    const b1Re = add(add(bRe, eRe), at(gyro, 18));
    const b1Im = add(add(bIm, eIm), at(gyro, 19));
    const b2Re = add(add(bRe, eRe), at(gyro, 20));
    const b2Im = add(add(bIm, eIm), at(gyro, 21));
    const gapRe = sub(at(gyro, 18), at(gyro, 20));
    const gapIm = sub(at(gyro, 19), at(gyro, 21));
    // p12 = (i u12 (b - V'22) + a V12)/det, p21 = (i u21 (b - V'11) + a V21)/det
    const n12Re = sub(re(aRe, aIm, v12Re, v12Im), im(u12Re, u12Im, b2Re, b2Im));
    const n12Im = add(im(aRe, aIm, v12Re, v12Im), re(u12Re, u12Im, b2Re, b2Im));
    const n21Re = sub(re(aRe, aIm, v21Re, v21Im), im(u21Re, u21Im, b1Re, b1Im));
    const n21Im = add(im(aRe, aIm, v21Re, v21Im), re(u21Re, u21Im, b1Re, b1Im));
    const p12Re = re(n12Re, n12Im, invRe, invIm);
    const p12Im = im(n12Re, n12Im, invRe, invIm);
    const p21Re = re(n21Re, n21Im, invRe, invIm);
    const p21Im = im(n21Re, n21Im, invRe, invIm);
    // 2 h det = a (V'22 - V'11) + U'21 V'12 - U'12 V'21 = a gap - i (u21 V12 - u12 V21)
    const kRe = sub(re(u21Re, u21Im, v12Re, v12Im), re(u12Re, u12Im, v21Re, v21Im));
    const kIm = sub(im(u21Re, u21Im, v12Re, v12Im), im(u12Re, u12Im, v21Re, v21Im));
    const nhRe = add(re(aRe, aIm, gapRe, gapIm), kIm);
    const nhIm = sub(im(aRe, aIm, gapRe, gapIm), kRe);
    const hRe = mul(both(0.5), re(nhRe, nhIm, invRe, invIm));
    const hIm = mul(both(0.5), im(nhRe, nhIm, invRe, invIm));
    // Z = B^-1 (P - A'), A' = i A for the first row; Y = -i Z
    const halfRe = mul(both(0.5), aRe);
    const halfIm = mul(both(0.5), aIm);
    const z11Re = add(add(halfRe, hRe), mul(xi, at(gyro, 13)));
    const z11Im = sub(add(halfIm, hIm), mul(xi, at(gyro, 12)));
    const z12Re = add(p12Re, u12Im);
    const z12Im = sub(p12Im, u12Re);
    const kappaRe = at(gyro, 4);
    const kappaIm = at(gyro, 5);
    put(state, 0, im(z11Re, z11Im, kappaRe, kappaIm));
    put(state, 1, f64x2.neg(re(z11Re, z11Im, kappaRe, kappaIm)));
    put(state, 2, im(z12Re, z12Im, kappaRe, kappaIm));
    put(state, 3, f64x2.neg(re(z12Re, z12Im, kappaRe, kappaIm)));
    put(state, 4, p21Im);
    put(state, 5, f64x2.neg(p21Re));
    put(state, 6, sub(halfIm, hIm));
    put(state, 7, sub(hRe, halfRe));
    gyro += stride;
    place += 4 * V;
    state += 8 * V;
    doubtful += V;
  }
}
