import type { PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';
import type { FitMaterial } from '../../shared/materialFit.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { DispersionValueError } from '../dispersion/opticalValue.ts';
import { DispersionRangeError } from '../dispersion/range.ts';
import { sampleIndex, sampleVoigt } from '../dispersion/sample.ts';
import { FitRefusal } from './fitRefusal.ts';
import type { Model } from './jacobian.ts';
import type { FittableIndex, FittableVoigt, ParameterVisit } from './visitParameters.ts';
import { visitIndexParameters, visitVoigtParameters } from './visitParameters.ts';

/** A model and how it is compared with a table. */
export type ComparedModel = {
  /** Every parameter that the model has, in the order in which they stand. */
  visit: (visit: ParameterVisit) => PlainIndex | PlainVoigt;
  /** Values for the parameters in that order: first column, then second column; throws where unusable. */
  columns: (parameters: readonly number[]) => [first: Float64Array, second: Float64Array];
  /** False for a real index: then only n is compared. */
  hasSecond: boolean;
};

/**
 * @param input the range of its start gives way to that of the wavelengths
 * @param wavelengthsNm of the points to be fitted, at least one
 * @throws FitRefusal where the model is not one of the target
 */
export function comparedModel(
  { target, start, content: { index } }: Pick<FitMaterial, 'target' | 'start'> & { content: MaterialContent },
  wavelengthsNm: number[],
): ComparedModel {
  const rangeNm: [number, number] = [wavelengthsNm[0]!, wavelengthsNm.at(-1)!];
  if (target === 'index') {
    const model = { ...indexModel(start), rangeNm };
    return {
      visit: (visit) => visitIndexParameters(model, visit),
      columns: (parameters) => {
        const { n, k } = sampleIndex(
          'the model',
          visitIndexParameters(model, taking(parameters)),
          wavelengthsNm,
        );
        return [n, k];
      },
      hasSecond: absorbs(model),
    };
  }
  const model = { ...voigtModel(start), rangeNm };
  // Only a gyration needs the index; sampled once, since it stays as it is.
  const needed = model.kind === 'lines' && model.of === 'gyration';
  const known = needed ? tabled(index, wavelengthsNm) : index;
  return {
    visit: (visit) => visitVoigtParameters(model, visit),
    columns: (parameters) => {
      const voigt = visitVoigtParameters(model, taking(parameters));
      const { re, im } = sampleVoigt('the model', { index: known, voigt }, wavelengthsNm);
      return [re, im];
    },
    hasSecond: true,
  };
}

/** The compared values in one column for the search, null where the model has none. */
export function searchable(compared: ComparedModel): Model {
  return (parameters) => {
    try {
      const [first, second] = compared.columns(parameters);
      if (!compared.hasSecond) return first;
      const values = new Float64Array(first.length + second.length);
      values.set(first);
      values.set(second, first.length);
      return values;
    } catch (error) {
      if (error instanceof DispersionValueError) return null;
      throw error;
    }
  };
}

function taking(parameters: readonly number[]): ParameterVisit {
  let position = 0;
  return () => parameters[position++]!;
}

function indexModel(start: PlainIndex | PlainVoigt): FittableIndex {
  if (start.kind === 'model' || start.kind === 'formula') return start;
  throw unsuited(`must be a model or a formula where n and k are fitted, got ${start.kind}`);
}

function voigtModel(start: PlainIndex | PlainVoigt): FittableVoigt {
  if (start.kind === 'lines') return start;
  if (start.kind !== 'formula')
    throw unsuited(`must be lines or a formula where Q is fitted, got a ${start.kind}`);
  if (!('quantity' in start) || start.quantity === undefined) {
    const { kind, expression, coefficients, rangeNm } = start;
    return { kind, expression, coefficients, rangeNm };
  }
  const message = `must be left out where Q is fitted: the formula is Q itself, got ${start.quantity}`;
  throw new FitRefusal([{ path: 'start.quantity', message }]);
}

function unsuited(message: string): FitRefusal {
  return new FitRefusal([{ path: 'start.kind', message }]);
}

function absorbs(index: FittableIndex): boolean {
  if (index.kind === 'formula') return (index.quantity ?? 'n') !== 'n';
  return (
    index.model.name === 'oscillators' || (index.model.name === 'cauchy' && index.model.tail !== undefined)
  );
}

function tabled(index: MaterialContent['index'], wavelengthsNm: number[]): PlainIndex {
  try {
    const { n, k } = sampleIndex('the index of this material', index, wavelengthsNm);
    return { kind: 'table', wavelengthsNm, n: [...n], k: [...k] };
  } catch (error) {
    if (!(error instanceof DispersionRangeError)) throw error;
    throw new FitRefusal([{ path: 'rangeNm', message: `${error.message} (lines of the gyration need it)` }]);
  }
}
