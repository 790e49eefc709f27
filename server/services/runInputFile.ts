import { applyAxis } from '../../shared/applyAxis.ts';
import { outputFor } from '../../shared/readings.ts';
import type { SweepAxis } from '../../shared/run.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument, StackItem } from '../../shared/stack.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { axisValues } from '../../shared/axisValues.ts';
import { materialKey } from '../../worker/sweep/sweepInput.ts';
import type { ComputePool } from '../../worker/pool.ts';
import type { RunInput } from '../models/run.ts';
import { resolveSafely } from './resolveSafely.ts';

/** Wavelengths or angles of one case at most; fewer in a large stack, so that a case stays a few MB of text. */
const CASE_VALUES = 10_000;
const CASE_SAMPLES = 60_000;
const CASES_AT_A_TIME = 200;

/**
 * The run as a request of the solve contract, piece by piece: `npm run -s solve -- input.json` gives the points of the
 * run in their order. The magnetization of the working point is put in, and constants stand as numbers.
 *
 * For each value of the family and of the second axis, a wavelength or an angle axis becomes one case (several where
 * it is long) and any other axis one for each of its values.
 */
export async function* runInputFile(
  pool: Pick<ComputePool, 'resolve'>,
  input: RunInput,
  materials: ResolvableMaterial[],
): AsyncGenerator<string> {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  let separator = '';
  yield '{"cases":[';
  for (const document of rowDocuments(input)) {
    for (const values of piecesOf(input)) {
      const cases = casesOf(document, input.axis, values).map((one) => withOutputs(one, input));
      const resolved = await resolveSafely(pool, cases, known);
      yield `${separator}${resolved.map((one) => JSON.stringify(one)).join(',')}`;
      separator = ',';
    }
  }
  yield ']}\n';
}

/** The document at each value of the family and the second axis, the second running faster. */
function* rowDocuments({ document, second, family }: RunInput): Generator<StackDocument> {
  for (const member of along(document, family)) yield* along(member, second);
}

function along(document: StackDocument, axis: SweepAxis | undefined): StackDocument[] {
  return axis ? axisValues(axis).map((value) => applyAxis(document, axis, value)) : [document];
}

function casesOf(document: StackDocument, axis: SweepAxis, values: number[]): LibrarySolveCase[] {
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

/** What the readings need beside the standard answer, where the stack can give it. */
function withOutputs(one: LibrarySolveCase, { readings }: RunInput): LibrarySolveCase {
  const addsIntensities = one.average !== undefined || one.backside !== undefined;
  const outputs = [...new Set(readings.flatMap((name) => outputFor(name) ?? []))].filter(
    (output) => !addsIntensities || output === 'mueller',
  );
  return outputs.length > 0 ? { ...one, outputs } : one;
}

/** Values of the first axis that are written at a time: of a wavelength axis every medium has a sample for each. */
function* piecesOf({ axis, document }: RunInput): Generator<number[]> {
  const size = pieceSize(axis, document);
  for (let start = 0; start < axis.points; start += size) {
    yield axisValues(axis, start, Math.min(size, axis.points - start));
  }
}

function pieceSize(axis: SweepAxis, document: StackDocument): number {
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
