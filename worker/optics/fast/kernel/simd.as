// Two points side by side: every v128 holds the same quantity of two neighbouring points. A complex quantity is two
// v128, real parts first. Functions here are inlined; the compiled kernel contains only straight code.

/** Bytes of one v128: the unit of all record layouts. */
export const V: usize = 16;

@inline
export function at(record: usize, slot: usize): v128 {
  return v128.load(record + slot * V);
}

@inline
export function put(record: usize, slot: usize, value: v128): void {
  v128.store(record + slot * V, value);
}

@inline
export function both(value: f64): v128 {
  return f64x2.splat(value);
}

/** A constant from a table, in both lanes: one instruction, where a literal would take three. */
@inline
export function entry(table: usize, index: usize): v128 {
  return v128.load64_splat(table + (index << 3));
}

@inline
export function add(a: v128, b: v128): v128 {
  return f64x2.add(a, b);
}

@inline
export function sub(a: v128, b: v128): v128 {
  return f64x2.sub(a, b);
}

@inline
export function mul(a: v128, b: v128): v128 {
  return f64x2.mul(a, b);
}

@inline
export function div(a: v128, b: v128): v128 {
  return f64x2.div(a, b);
}

/** Real part of a b. */
@inline
export function re(aRe: v128, aIm: v128, bRe: v128, bIm: v128): v128 {
  return f64x2.sub(f64x2.mul(aRe, bRe), f64x2.mul(aIm, bIm));
}

/** Imaginary part of a b. */
@inline
export function im(aRe: v128, aIm: v128, bRe: v128, bIm: v128): v128 {
  return f64x2.add(f64x2.mul(aRe, bIm), f64x2.mul(aIm, bRe));
}

/** Modulus squared. */
@inline
export function norm(aRe: v128, aIm: v128): v128 {
  return f64x2.add(f64x2.mul(aRe, aRe), f64x2.mul(aIm, aIm));
}

/** 1 / |z|^2, kept finite where z is exactly zero: a guided mode or a field node met by accident. */
@inline
export function inverseNorm(aRe: v128, aIm: v128): v128 {
  return f64x2.div(both(1), f64x2.max(norm(aRe, aIm), both(1e-120)));
}

@inline
export function choose(mask: v128, yes: v128, no: v128): v128 {
  return v128.bitselect(yes, no, mask);
}
