import type { SolveCase, StackItemInput } from '../../shared/solve.ts';
import { findLayerPath, toSolveCase } from '../../shared/stackCase.ts';
import { resolveCase } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { axisValues } from '../../worker/sweep/axisValues.ts';
import { materialKey } from '../../worker/sweep/sweepInput.ts';
import type { RunInput } from '../models/run.ts';

/** Wavelengths of one case at most; fewer in a stack of many layers, so that a case stays a few MB of text. */
const CASE_WAVELENGTHS = 10_000;
const CASE_SAMPLES = 60_000;
const NUMBERS_AT_A_TIME = 5_000;
const CASES_AT_A_TIME = 200;

/**
 * The run as a request of the solve contract, piece by piece: `npm run -s solve -- input.json` gives the points of the
 * run in their order. The magnetization of the working point is put in, and constants stand as numbers.
 *
 * A wavelength axis becomes one case (several where it is long), an angle axis one case, and a thickness axis one case
 * for each thickness.
 */
export function* runInputFile(input: RunInput, materials: ResolvableMaterial[]): Generator<string> {
  yield '{"cases":[';
  yield* casesOf(input, new Map(materials.map((material) => [materialKey(material), material])));
  yield ']}\n';
}

function* casesOf(
  { document, axis }: RunInput,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): Generator<string> {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  const resolve = (wavelengths: number | number[]) =>
    resolveCase(toSolveCase(document, wavelengths, angleDeg), materials);
  switch (axis.kind) {
    case 'wavelength': {
      const size = Math.max(1, Math.min(CASE_WAVELENGTHS, Math.floor(CASE_SAMPLES / countMedia(document))));
      for (let start = 0; start < axis.points; start += size) {
        const values = axisValues(axis, start, Math.min(size, axis.points - start));
        yield `${start > 0 ? ',' : ''}${JSON.stringify(resolve(values))}`;
      }
      return;
    }
    case 'angle': {
      const { angleDeg: _angle, ...rest } = resolve(wavelengthNm);
      yield '{"angleDeg":[';
      for (let start = 0; start < axis.points; start += NUMBERS_AT_A_TIME) {
        const values = axisValues(axis, start, Math.min(NUMBERS_AT_A_TIME, axis.points - start));
        yield `${start > 0 ? ',' : ''}${values.join(',')}`;
      }
      yield `],${JSON.stringify(rest).slice(1)}`;
      return;
    }
    case 'thickness': {
      const path = findLayerPath(document.layers, axis.layerId);
      if (!path) throw new Error(`The run sweeps the layer ${axis.layerId}, which its stack does not have.`);
      const resolved = resolve(wavelengthNm);
      for (let start = 0; start < axis.points; start += CASES_AT_A_TIME) {
        const values = axisValues(axis, start, Math.min(CASES_AT_A_TIME, axis.points - start));
        const cases = values.map((thicknessNm) => JSON.stringify(withThickness(resolved, path, thicknessNm)));
        yield `${start > 0 ? ',' : ''}${cases.join(',')}`;
      }
    }
  }
}

function withThickness(given: SolveCase, path: number[], thicknessNm: number): SolveCase {
  return { ...given, layers: changeAt(given.layers, path, thicknessNm) };
}

function changeAt(
  items: StackItemInput[],
  [position, ...inner]: number[],
  thicknessNm: number,
): StackItemInput[] {
  return items.map((item, index) => {
    if (index !== position) return item;
    return 'layers' in item
      ? { ...item, layers: changeAt(item.layers, inner, thicknessNm) }
      : { ...item, thicknessNm };
  });
}

function countMedia({ layers }: RunInput['document']): number {
  const count = (items: RunInput['document']['layers']): number =>
    items.reduce((sum, item) => sum + ('layers' in item ? count(item.layers) : 1), 0);
  return 2 + count(layers);
}
