/** Points of a plotted curve at most; more than a plot can show. */
export const CURVE_POINTS = 400;

/** At how many wavelengths of its range a formula or model is tried: those of its curve and two between each. */
export const TRIAL_POINTS = 3 * (CURVE_POINTS - 1) + 1;

/**
 * Wavelengths even in their logarithm, both ends included to the last bit: a formula bends most at its blue end and
 * may reach far into the infrared. One wavelength where the ends are equal.
 */
export function logarithmicGrid([fromNm, toNm]: readonly [number, number], points: number): number[] {
  if (fromNm === toNm) return [fromNm];
  const grid = Array.from({ length: points }, (_, i) => fromNm * (toNm / fromNm) ** (i / (points - 1)));
  grid[points - 1] = toNm;
  return grid;
}
