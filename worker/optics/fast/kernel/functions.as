import { add, both, choose, div, entry, mul, sub } from './simd.as';

// Elementary functions of two values at once. Each states its range and error; all are polynomials, since the core
// of the language has none for vectors. Coefficients "fit" are Chebyshev interpolations made for these ranges with
// 40 digits; all others are Taylor coefficients.

/** (-1)^k / (2k+1)!, for sin. */
const SINE: usize = memory.data<f64>([
  1.0, -1.6666666666666666e-1, 8.333333333333333e-3, -1.984126984126984e-4, 2.7557319223985893e-6,
  -2.505210838544172e-8, 1.6059043836821613e-10, -7.647163731819816e-13, 2.8114572543455206e-15,
  -8.22063524662433e-18, 1.9572941063391263e-20, -3.868170170630684e-23,
]);

/** (-1)^k / (2k)!, for cos. */
const COSINE: usize = memory.data<f64>([
  1.0, -0.5, 4.1666666666666664e-2, -1.388888888888889e-3, 2.48015873015873e-5, -2.755731922398589e-7,
  2.08767569878681e-9, -1.1470745597729725e-11, 4.779477332387385e-14, -1.5619206968586225e-16,
]);

/** 1 / n!, for exp. */
const EXPONENTIAL: usize = memory.data<f64>([
  1.0, 1.0, 0.5, 1.6666666666666666e-1, 4.1666666666666664e-2, 8.333333333333333e-3, 1.388888888888889e-3,
  1.984126984126984e-4, 2.48015873015873e-5, 2.7557319223985893e-6, 2.755731922398589e-7,
  2.505210838544172e-8, 2.08767569878681e-9, 1.6059043836821613e-10,
]);

/** atan(t)/t in t^2 for |t| <= tan(pi/8), fit, relative error 7e-17. */
const ARCTANGENT: usize = memory.data<f64>([
  1.0, -0.3333333333332844, 0.1999999999885511, -0.14285714180976467, 0.11111106180455946,
  -0.09090773074808414, 0.07689953496306857, -0.06640233930429408, 0.056883492268090106,
  -0.04348052215716462, 0.021135373157693246,
]);

/** atan(t)/t in t^2 for |t| <= 0.05: (-1)^k / (2k+1). */
const SMALL_ARCTANGENT: usize = memory.data<f64>([
  1.0, -0.3333333333333333, 0.2, -0.14285714285714285, 0.1111111111111111, -0.09090909090909091,
]);

@inline
function horner(table: usize, degree: usize, x: v128): v128 {
  let sum = entry(table, degree);
  for (let k = degree; k > 0; k--) sum = add(mul(sum, x), entry(table, k - 1));
  return sum;
}

/** sin for |x| <= pi/2, error 1 unit in the last place or so; tiny x keep their digits. */
export function sineOfAngle(x: v128): v128 {
  return mul(x, horner(SINE, 11, mul(x, x)));
}

/** exp for x <= 0; zero below -700. */
@inline
export function decayOf(x: v128): v128 {
  const bounded = f64x2.max(x, both(-700));
  const n = f64x2.nearest(mul(bounded, both(1.4426950408889634)));
  // ln 2 in two parts, the first with 32 bits, so that n times it is exact.
  let r = sub(bounded, mul(n, both(0.6931471803691238)));
  r = sub(r, mul(n, both(1.9082149292705877e-10)));
  const power = i64x2.shl(
    i64x2.add(i64x2.extend_low_i32x4_s(i32x4.trunc_sat_f64x2_s_zero(n)), i64x2.splat(1023)),
    52,
  );
  return v128.and(mul(horner(EXPONENTIAL, 13, r), power), f64x2.gt(x, both(-700)));
}

/** x less the nearest multiple n of pi/2, for |n| < 2^20: pi/2 in three parts, the first with 33 bits. */
@inline
export function quarterTurns(x: v128): v128 {
  return f64x2.nearest(mul(x, both(0.6366197723675814)));
}

@inline
export function withinQuarter(x: v128, n: v128): v128 {
  let r = sub(x, mul(n, both(1.5707963267341256)));
  r = sub(r, mul(n, both(6.077100506303966e-11)));
  return sub(r, mul(n, both(2.0222662487959506e-21)));
}

@inline
function turned(r: v128, quadrant: v128): v128 {
  const square = mul(r, r);
  const odd = i64x2.eq(v128.and(quadrant, i64x2.splat(1)), i64x2.splat(1));
  const value = choose(odd, horner(COSINE, 9, square), mul(r, horner(SINE, 9, square)));
  return v128.xor(value, i64x2.shl(v128.and(quadrant, i64x2.splat(2)), 62));
}

/** sin and cos for |x| < 1.6e6 from one reduction: `turned` by n and by n + 1 quarters. */
@inline
export function sineOf(r: v128, n: v128): v128 {
  return turned(r, i64x2.extend_low_i32x4_s(i32x4.trunc_sat_f64x2_s_zero(n)));
}

@inline
export function cosineOf(r: v128, n: v128): v128 {
  return turned(
    r,
    i64x2.add(i64x2.extend_low_i32x4_s(i32x4.trunc_sat_f64x2_s_zero(n)), i64x2.splat(1)),
  );
}

/** atan2(y, x); relative accuracy is kept where the angle is tiny. atan2(0, 0) = 0 or pi. */
@inline
export function angleOf(y: v128, x: v128): v128 {
  const quick = f64x2.lt(f64x2.abs(y), mul(x, both(0.05)));
  if (i64x2.all_true(quick)) {
    const t = div(y, x);
    return mul(t, horner(SMALL_ARCTANGENT, 5, mul(t, t)));
  }
  return anyAngleOf(y, x);
}

function anyAngleOf(y: v128, x: v128): v128 {
  const ay = f64x2.abs(y);
  const ax = f64x2.abs(x);
  const small = f64x2.min(ax, ay);
  const large = f64x2.max(f64x2.max(ax, ay), both(1e-300));
  // Beyond tan(pi/8): atan(q) = pi/4 + atan((q - 1)/(q + 1)).
  const wide = f64x2.gt(small, mul(large, both(0.41421356237309503)));
  const t = div(choose(wide, sub(small, large), small), choose(wide, add(small, large), large));
  let angle = mul(t, horner(ARCTANGENT, 10, mul(t, t)));
  angle = add(angle, v128.and(wide, both(0.7853981633974483)));
  angle = choose(f64x2.gt(ay, ax), sub(both(1.5707963267948966), angle), angle);
  angle = choose(f64x2.lt(x, both(0)), sub(both(3.141592653589793), angle), angle);
  return v128.bitselect(y, angle, i64x2.splat(i64.MIN_VALUE));
}

/**
 * Square root that belongs to a forward wave (`forwardRoot` of complexNumber.ts): principal, but turned for values
 * with both parts negative. Real part; the imaginary part is `forwardRootIm`.
 */
@inline
function largerPart(a: v128, b: v128): v128 {
  const size = f64x2.sqrt(add(mul(a, a), mul(b, b)));
  return f64x2.max(f64x2.sqrt(mul(add(size, f64x2.abs(a)), both(0.5))), both(1e-150));
}

/** Writes the root of (a, b) to two slots. */
@inline
export function storeForwardRoot(record: usize, a: v128, b: v128): void {
  const larger = largerPart(a, b);
  const smaller = div(mul(b, both(0.5)), larger);
  const positive = f64x2.ge(a, both(0));
  // a < 0: (|smaller|, larger) for b >= 0, and for b < 0 the principal (|smaller|, -larger) negated.
  const sign = v128.and(b, i64x2.splat(i64.MIN_VALUE));
  v128.store(record, choose(positive, larger, v128.xor(f64x2.abs(smaller), sign)));
  v128.store(record + 16, choose(positive, smaller, larger));
}
