/**
 * Piecewise cubic interpolation that keeps the shape of the data: it passes through every point, is monotone
 * between two neighbours (so it never leaves the interval they span) and has a continuous slope.
 * Slopes after F. N. Fritsch and J. Butland, SIAM J. Sci. Stat. Comput. 5, 300 (1984), which meet the condition
 * of F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17, 238 (1980).
 */

/** Slope dy/dx at each point; `x` strictly monotone, same length as `y`, at least two points. */
export function monotoneSlopes(x: Float64Array, y: Float64Array): Float64Array {
  const count = x.length;
  const slopes = new Float64Array(count);
  if (count === 2) return slopes.fill(secant(x, y, 0));
  for (let i = 1; i < count - 1; i++) {
    const before = secant(x, y, i - 1);
    const after = secant(x, y, i);
    // At a turning point of the data the slope stays 0, so that the point itself is the extremum.
    if (before * after > 0) {
      const widthBefore = Math.abs(x[i]! - x[i - 1]!);
      const widthAfter = Math.abs(x[i + 1]! - x[i]!);
      const weight = (widthBefore + 2 * widthAfter) / (3 * (widthBefore + widthAfter));
      // Divided before it is multiplied: before * after of two tiny slopes would underflow.
      slopes[i] = before / (weight + (1 - weight) * (before / after));
    }
  }
  slopes[0] = endSlope(secant(x, y, 0), secant(x, y, 1), x[1]! - x[0]!, x[2]! - x[1]!);
  const last = count - 1;
  slopes[last] = endSlope(
    secant(x, y, last - 1),
    secant(x, y, last - 2),
    x[last]! - x[last - 1]!,
    x[last - 1]! - x[last - 2]!,
  );
  return slopes;
}

function secant(x: Float64Array, y: Float64Array, i: number): number {
  return (y[i + 1]! - y[i]!) / (x[i + 1]! - x[i]!);
}

/** Three-point end formula, limited so that the outermost interval stays monotone. */
function endSlope(nearest: number, next: number, width: number, nextWidth: number): number {
  const parabola = ((2 * width + nextWidth) * nearest - width * next) / (width + nextWidth);
  if (parabola * nearest <= 0) return 0;
  return Math.abs(parabola) > 3 * Math.abs(nearest) ? 3 * nearest : parabola;
}

/**
 * Value between point `i` and point `i + 1` at `t` in [0, 1), the fraction of the way in x.
 * At t = 0 it is y[i] to the last bit.
 */
export function cubicValue(
  x: Float64Array,
  y: Float64Array,
  slopes: Float64Array,
  i: number,
  t: number,
): number {
  const from = y[i]!;
  const to = y[i + 1]!;
  const width = x[i + 1]! - x[i]!;
  const rise = to - from;
  const a = slopes[i]! * width;
  const b = slopes[i + 1]! * width;
  const value = from + t * (a + t * (3 * rise - 2 * a - b + t * (a + b - 2 * rise)));
  // The cubic is monotone; rounding may still cross an end by an ulp, which would turn k = 0 into k < 0.
  return from < to ? Math.min(Math.max(value, from), to) : Math.max(Math.min(value, from), to);
}
