import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { FitMaterial, FitResult } from '../../shared/materialFit.ts';
import type { ComparedModel } from './comparedModel.ts';
import { comparedModel, searchable } from './comparedModel.ts';
import type { FitParameter } from './fitParameters.ts';
import { checkFixed, checkStart, parametersOf } from './fitParameters.ts';
import { FitRefusal } from './fitRefusal.ts';
import type { FittedTable } from './fittedTable.ts';
import { fittedTable } from './fittedTable.ts';
import type { Model } from './jacobian.ts';
import { judgeFit } from './judgeFit.ts';
import { leastSquares } from './leastSquares.ts';

export type FitInput = Pick<FitMaterial, 'target' | 'start' | 'fixed' | 'rangeNm'> & {
  /** The material whose table is fitted. */
  content: MaterialContent;
};

/** Values that a fit may ask its model for, over all points: some ten seconds of computing. */
const MOST_VALUES = 100_000_000;
/** Iterations that a fit should be good for; with more points than that allows it is refused. */
const FEWEST_ITERATIONS = 20;

/**
 * Fits a model to the tabulated points of a material, all with equal weight: n and k, or Re Q and Im Q. Of a model
 * without absorption only n is compared.
 *
 * @returns the model with fitted values, and what they are worth: residuals, one standard deviation of each
 * parameter, remarks
 * @throws FitRefusal with every issue at once, paths as in `fitMaterialSchema`
 */
export function fitMaterial(input: FitInput): FitResult {
  const fixed = input.fixed ?? [];
  const table = fittedTable(input);
  const compared = comparedModel(input, table.wavelengthsNm);
  const parameters = parametersOf(compared, fixed);
  const free = parameters.flatMap((parameter, position) => (parameter.fixed ? [] : [position]));
  const data = Float64Array.from(compared.hasSecond ? [...table.first, ...table.second] : table.first);
  const mostCalls = Math.floor(MOST_VALUES / data.length);
  const issues = [
    ...checkFixed(fixed, parameters),
    ...checkPoints(table.wavelengthsNm.length, data.length, free.length, mostCalls),
    ...checkStart(compared, parameters),
  ];
  if (issues.length > 0) throw new FitRefusal(issues);

  const whole = searchable(compared);
  const model: Model = (values) => whole(completed(parameters, free, values));
  const answer = leastSquares({
    model,
    data,
    start: free.map((position) => parameters[position]!.value),
    lower: free.map((position) => parameters[position]!.lower),
    mostCalls,
  });
  const judged = judgeFit(
    model,
    answer,
    free.map((position) => parameters[position]!),
  );
  const values = completed(parameters, free, answer.parameters);
  const residuals = residualsOf(compared, table, values);
  let position = 0;
  return {
    fitted: compared.visit(() => values[position++]!),
    parameters: parameters.map((parameter, i) => ({
      name: parameter.name,
      unit: parameter.unit,
      value: values[i]!,
      uncertainty: judged.deviations[free.indexOf(i)] ?? null,
      fixed: parameter.fixed,
    })),
    residuals,
    deviation: rootMeanSquare([...residuals.first, ...residuals.second]),
    points: table.wavelengthsNm.length,
    iterations: answer.iterations,
    remarks: [...remarksOnData(compared, parameters, table), ...judged.remarks],
  };
}

/** Values of all parameters where those of the free ones are given. */
function completed(
  parameters: readonly FitParameter[],
  free: readonly number[],
  values: readonly number[],
): number[] {
  const all = parameters.map(({ value }) => value);
  free.forEach((position, i) => (all[position] = values[i]!));
  return all;
}

function checkPoints(points: number, values: number, free: number, mostCalls: number): Issue[] {
  if (values <= free) {
    const message = `holds ${points} tabulated points, ${values} numbers to compare, which is too few for ${free} parameters: widen it, fix parameters or use fewer terms`;
    return [{ path: 'rangeNm', message }];
  }
  if (mostCalls < FEWEST_ITERATIONS * (2 * free + 2)) {
    const message = `holds ${points} tabulated points, which is too many for ${free} parameters: narrow it, or fix parameters`;
    return [{ path: 'rangeNm', message }];
  }
  return [];
}

function residualsOf(
  compared: ComparedModel,
  { wavelengthsNm, first, second }: FittedTable,
  parameters: readonly number[],
): FitResult['residuals'] {
  const [fittedFirst, fittedSecond] = compared.columns(parameters);
  return {
    wavelengthsNm,
    first: first.map((value, i) => value - fittedFirst[i]!),
    second: second.map((value, i) => value - fittedSecond[i]!),
  };
}

function rootMeanSquare(values: readonly number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

function remarksOnData(
  compared: ComparedModel,
  parameters: readonly FitParameter[],
  { second }: FittedTable,
): string[] {
  const largest = second.reduce((most, k) => Math.max(most, k), 0);
  const remarks = parameters
    .filter(({ reference }) => reference)
    .map(({ name }) => `${name} only says where tail.k is meant; it stays as it is.`);
  if (!compared.hasSecond && largest > 0) {
    remarks.push(`The model has no absorption: only n was compared; k of the table reaches ${largest}.`);
  }
  return remarks;
}
