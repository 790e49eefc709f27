import { applyAxis } from '../../shared/applyAxis.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackItem } from '../../shared/stack.ts';
import { resolveCase } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { axisValues } from '../../worker/sweep/axisValues.ts';
import { materialKey } from '../../worker/sweep/sweepInput.ts';
import type { RunInput } from '../models/run.ts';

/** Wavelengths or angles of one case at most; fewer in a large stack, so that a case stays a few MB of text. */
const CASE_VALUES = 10_000;
const CASE_SAMPLES = 60_000;
const CASES_AT_A_TIME = 200;

/**
 * The run as a request of the solve contract, piece by piece: `npm run -s solve -- input.json` gives the points of the
 * run in their order. The magnetization of the working point is put in, and constants stand as numbers.
 *
 * A wavelength or an angle axis becomes one case (several where it is long), a thickness axis one for each thickness.
 */
export function* runInputFile(input: RunInput, materials: ResolvableMaterial[]): Generator<string> {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const size = piecesOf(input);
  yield '{"cases":[';
  for (let start = 0; start < input.axis.points; start += size) {
    const values = axisValues(input.axis, start, Math.min(size, input.axis.points - start));
    const cases = casesOf(input, values).map((one) => JSON.stringify(resolveCase(one, known)));
    yield `${start > 0 ? ',' : ''}${cases.join(',')}`;
  }
  yield ']}\n';
}

function casesOf({ document, axis }: RunInput, values: number[]): LibrarySolveCase[] {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  switch (axis.kind) {
    case 'wavelength':
      return [toSolveCase(document, values, angleDeg)];
    case 'angle':
      return [toSolveCase(document, wavelengthNm, values)];
    default:
      return values.map((value) => toSolveCase(applyAxis(document, axis, value), wavelengthNm, angleDeg));
  }
}

/** Points that are written at a time: of a wavelength axis every medium has a sample for each. */
function piecesOf({ axis, document }: RunInput): number {
  switch (axis.kind) {
    case 'wavelength':
      return Math.max(1, Math.min(CASE_VALUES, Math.floor(CASE_SAMPLES / (2 + countItems(document.layers)))));
    case 'angle':
      return CASE_VALUES;
    default:
      return CASES_AT_A_TIME;
  }
}

function countItems(items: StackItem[]): number {
  return items.reduce((sum, item) => sum + ('layers' in item ? countItems(item.layers) : 1), 0);
}
