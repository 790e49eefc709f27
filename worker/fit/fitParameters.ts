import type { Issue } from '../../shared/error.ts';
import { DispersionValueError } from '../dispersion/opticalValue.ts';
import type { ComparedModel } from './comparedModel.ts';
import type { ParameterSpec } from './visitParameters.ts';

/** A parameter at its start; a fixed one keeps its value. */
export type FitParameter = ParameterSpec & { value: number; fixed: boolean };

export function parametersOf(compared: ComparedModel, fixed: readonly string[]): FitParameter[] {
  const parameters: FitParameter[] = [];
  compared.visit((value, spec) => {
    parameters.push({ ...spec, value, fixed: spec.reference === true || fixed.includes(spec.name) });
    return value;
  });
  return parameters;
}

/** Names to be fixed that the model does not have, and a model with nothing left to fit. */
export function checkFixed(fixed: readonly string[], parameters: readonly FitParameter[]): Issue[] {
  const names = parameters.map(({ name }) => name);
  const issues = fixed.flatMap((name, i) =>
    names.includes(name)
      ? []
      : [
          {
            path: `fixed[${i}]`,
            message: `is no parameter of this model, got ${name}: use ${listed(names)}`,
          },
        ],
  );
  if (parameters.every((parameter) => parameter.fixed)) {
    const message =
      names.length === 0
        ? 'must have a coefficient: write the formula with c1, c2, ... and give their start values'
        : 'must leave a parameter to be fitted';
    issues.push({ path: names.length === 0 ? 'start.coefficients' : 'fixed', message });
  }
  return issues;
}

/** A start that is illegal or has no value at some of the points. */
export function checkStart(compared: ComparedModel, parameters: readonly FitParameter[]): Issue[] {
  const illegal = parameters.filter(({ value, lower }) => value < lower);
  if (illegal.length > 0) {
    return illegal.map(({ name, lower, value }) => ({
      path: 'start',
      message: `${name} must start at ${lower} or more, got ${value}`,
    }));
  }
  try {
    compared.columns(parameters.map(({ value }) => value));
    return [];
  } catch (error) {
    if (!(error instanceof DispersionValueError)) throw error;
    return [{ path: 'start', message: `${error.message}; choose other start values or another range` }];
  }
}

function listed(names: readonly string[]): string {
  return names.length === 0 ? 'none, it has no parameters' : names.join(', ');
}
