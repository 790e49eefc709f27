import type { Model } from './jacobian.ts';
import { jacobianColumns } from './jacobian.ts';
import type { LeastSquaresAnswer } from './leastSquares.ts';
import { uncertainties } from './uncertainties.ts';
import type { ParameterSpec } from './visitParameters.ts';

/** More pairs than this are counted, not listed. */
const LISTED_PAIRS = 8;

/**
 * What fitted parameters are worth.
 *
 * @param specs of the fitted parameters, in the order of the answer
 * @returns one standard deviation each, null where there is none, and why in the remarks
 */
export function judgeFit(
  model: Model,
  { parameters, values, squares, settled, iterations }: LeastSquaresAnswer,
  specs: readonly ParameterSpec[],
): { deviations: (number | null)[]; remarks: string[] } {
  const columns = jacobianColumns(model, parameters, values);
  const inner = specs.flatMap(({ lower }, i) => (parameters[i]! > lower ? [i] : []));
  const innerNames = inner.map((i) => specs[i]!.name);
  const variance = squares / (values.length - inner.length);
  const found = uncertainties(
    inner.map((i) => columns[i]!),
    variance,
  );
  const deviations = specs.map((_, i) => found.deviations[inner.indexOf(i)] ?? null);
  const remarks: string[] = [];
  if (!settled) {
    remarks.push(
      `Stopped after ${iterations} iterations without coming to rest: start again from these values, or fix a parameter.`,
    );
  }
  specs.forEach(({ name, lower }, i) => {
    if (!inner.includes(i)) {
      remarks.push(
        `${name} stands at its limit ${lower}: it has no uncertainty, and the term may not be needed.`,
      );
    }
  });
  const lost = innerNames.filter((_, i) => found.deviations[i] === null);
  if (lost.length > 0) {
    remarks.push(`Not determined by these points: ${lost.join(', ')}. Fix one of them, or use fewer terms.`);
  }
  for (const { first, second, rho } of found.correlations.slice(0, LISTED_PAIRS)) {
    remarks.push(
      `${innerNames[first]!} and ${innerNames[second]!} can hardly be told apart (correlation ${rho.toFixed(3)}).`,
    );
  }
  const more = found.correlations.length - LISTED_PAIRS;
  if (more > 0) remarks.push(`${more} more pairs of parameters are correlated as strongly.`);
  return { deviations, remarks };
}
