import type { SweepAxis } from './run.ts';

/**
 * The value of an axis at one of its points, in the axis's own unit (nm or deg).
 *
 * Both ends are exact, so that a sweep to the end of a table never asks one rounding beyond it; the values between
 * are held inside the ends for the same reason. A single point stands at `from`.
 *
 * @param index 0 .. axis.points - 1
 */
export function axisValueAt(axis: SweepAxis, index: number): number {
  const { from, to, points } = axis;
  if (index === 0) return from;
  if (index === points - 1) return to;
  const part = index / (points - 1);
  const value =
    axis.spacing === 'linear' ? from + (to - from) * part : from * Math.exp(part * Math.log(to / from));
  return Math.min(Math.max(value, Math.min(from, to)), Math.max(from, to));
}

/** The values of `count` points of an axis from `start` on. */
export function axisValues(axis: SweepAxis, start = 0, count = axis.points): number[] {
  return Array.from({ length: count }, (_, offset) => axisValueAt(axis, start + offset));
}
