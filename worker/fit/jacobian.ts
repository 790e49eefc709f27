/**
 * Values that a model gives for parameters, all of them in one column; null where a parameter makes it unusable.
 */
export type Model = (parameters: readonly number[]) => Float64Array | null;

/** Balances the error of a central difference (h^2) against rounding (1/h): the cube root of the last digit. */
const STEP = Math.cbrt(Number.EPSILON);
/** A parameter that is 0 is moved as if it were this large. */
const LEAST_SIZE = 0.01;

/**
 * Derivatives of the model by each parameter, one column each, by central differences; one-sided where the model is
 * unusable on the other side, and 0 where it is so on both.
 *
 * @param values what the model gives at `parameters`
 */
export function jacobianColumns(
  model: Model,
  parameters: readonly number[],
  values: Float64Array,
): Float64Array[] {
  return parameters.map((value, position) => {
    const step = STEP * Math.max(Math.abs(value), LEAST_SIZE);
    const [above, below] = [value + step, value - step];
    const high = model(parameters.with(position, above));
    const low = model(parameters.with(position, below));
    const upper = high ?? values;
    const lower = low ?? values;
    const width = (high ? above : value) - (low ? below : value);
    return width === 0
      ? new Float64Array(values.length)
      : Float64Array.from(upper, (entry, i) => (entry - lower[i]!) / width);
  });
}

/** Euclidean length of a column. */
export function lengthOf(column: Float64Array): number {
  return Math.sqrt(column.reduce((sum, entry) => sum + entry * entry, 0));
}
