import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import type { Model } from './jacobian.ts';
import { jacobianColumns, lengthOf } from './jacobian.ts';

export type LeastSquaresProblem = {
  model: Model;
  data: Float64Array;
  start: readonly number[];
  /** Least legal value of each parameter. */
  lower: readonly number[];
  /** Calls of the model after which the search ends as it stands. */
  mostCalls: number;
};

export type LeastSquaresAnswer = {
  parameters: number[];
  values: Float64Array;
  /** Sum of the squares of the residuals. */
  squares: number;
  iterations: number;
  /** False where the search ended before it stood still. */
  settled: boolean;
};

const MOST_ITERATIONS = 500;
const FIRST_DAMPING = 1e-3;
const LEAST_DAMPING = 1e-14;
/** At this damping a step is along the gradient and as short as rounding: no step down means a minimum. */
const MOST_DAMPING = 1e12;
/** A nearly undamped step that changes the fitted values by less than this fraction of the residuals is none. */
const STANDSTILL = 1e-9;

/**
 * Least squares by the Levenberg-Marquardt steps of ml-levenberg-marquardt (K. Levenberg, Q. Appl. Math. 2, 164
 * (1944); D. Marquardt, SIAM J. Appl. Math. 11, 431 (1963)).
 *
 * The library keeps a step that made things worse and adds one damping to all parameters whatever their units. So it is
 * asked for one step at a time, from the best parameters so far, in parameters divided by the length of their
 * column of the Jacobian; a step that does not improve is repeated with more damping. A parameter that stands at
 * its bound and would go beyond rests for that step, or it would bend the step of the others.
 */
export function leastSquares({
  model,
  data,
  start,
  lower,
  mostCalls,
}: LeastSquaresProblem): LeastSquaresAnswer {
  let calls = 0;
  const counted: Model = (parameters) => {
    calls++;
    return model(parameters);
  };
  let best = { parameters: [...start], values: counted(start)!, squares: 0 };
  best.squares = squaresOf(data, best.values);
  let damping = FIRST_DAMPING;
  let iterations = 0;
  while (iterations < MOST_ITERATIONS && calls < mostCalls) {
    iterations++;
    const step = stepper(counted, data, lower, best);
    let next = step(damping);
    while (next.squares >= best.squares && damping < MOST_DAMPING) {
      damping *= 10;
      next = step(damping);
    }
    if (next.squares >= best.squares) return { ...best, iterations, settled: true };
    const moved = lengthOf(next.values.map((value, i) => value - best.values[i]!));
    const still = damping <= FIRST_DAMPING && moved <= STANDSTILL * Math.sqrt(next.squares);
    best = next;
    if (still) return { ...best, iterations, settled: true };
    damping = Math.max(damping / 10, LEAST_DAMPING);
  }
  return { ...best, iterations, settled: false };
}

type Position = { parameters: number[]; values: Float64Array; squares: number };

/** One step of the library from `from` as a function of the damping; the position itself where it does not improve. */
function stepper(
  model: Model,
  data: Float64Array,
  lower: readonly number[],
  from: Position,
): (damping: number) => Position {
  const columns = jacobianColumns(model, from.parameters, from.values);
  const residuals = data.map((value, i) => value - from.values[i]!);
  const scales = columns.map((column, j) => {
    const length = lengthOf(column);
    const outward = column.reduce((sum, entry, i) => sum + entry * residuals[i]!, 0) <= 0;
    const rests = length === 0 || (from.parameters[j]! <= lower[j]! && outward);
    return rests ? 0 : 1 / length;
  });
  const toParameters = (scaled: readonly number[]) =>
    from.parameters.map((value, j) => Math.max(value + scaled[j]! * scales[j]!, lower[j]!));
  // The library asks for a function of one number: the position of a value in the column stands for it.
  let known: { scaled: readonly number[]; values: Float64Array | null } = { scaled: [], values: null };
  const valuesAt = (scaled: readonly number[]): Float64Array | null => {
    if (scaled.every((value) => value === 0)) return from.values;
    if (scaled.some((value, j) => value !== known.scaled[j])) {
      known = { scaled: [...scaled], values: model(toParameters(scaled)) };
    }
    return known.values;
  };
  const positions = Array.from(data.keys());
  return (damping) => {
    const { parameterValues, parameterError } = levenbergMarquardt(
      { x: positions, y: data },
      (scaled) => {
        const values = valuesAt(scaled);
        return (position) => (values ? values[position]! : NaN);
      },
      {
        initialValues: from.parameters.map(() => 0),
        minValues: from.parameters.map((value, j) =>
          scales[j] === 0 ? 0 : (lower[j]! - value) / scales[j]!,
        ),
        maxValues: from.parameters.map(() => Infinity),
        jacobianFunction: () => (position) => columns.map((column, j) => column[position]! * scales[j]!),
        damping,
        maxIterations: 1,
        errorTolerance: 0,
      },
    );
    return {
      parameters: toParameters(parameterValues),
      values: valuesAt(parameterValues) ?? from.values,
      squares: parameterError,
    };
  };
}

function squaresOf(data: Float64Array, values: Float64Array): number {
  return data.reduce((sum, value, i) => sum + (value - values[i]!) ** 2, 0);
}
