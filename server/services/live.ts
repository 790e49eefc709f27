import { createHash } from 'node:crypto';
import type { AngleFeatures, LiveCurveRequest } from '../../shared/live.ts';
import { describeResult, encodeResultHeader } from '../../shared/resultFormat.ts';
import type { SweepAxes } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { Dependencies } from '../dependencies.ts';
import { gone, invalid } from '../errors.ts';
import type { LoadedMaterial } from './materialStore.ts';
import { checkRunDocument, runCase } from './runCases.ts';
import { toDocumentIssues } from './runPaths.ts';

type Live = Pick<Dependencies, 'materials' | 'pool'>;

/** Where the angle features are looked for, as the axis of a sweep. */
const ALL_ANGLES = { kind: 'angle', from: 0, to: 89.99, points: 2, spacing: 'linear' } as const;

/**
 * One curve as the binary file of shared/resultFormat.ts. Everything that takes time, formulas of people too, is done
 * in a thread.
 *
 * @param groupIds groups whose materials are in reach, beside the shipped library
 * @param signal ends the work when nobody waits for it any more
 * @throws Refusal 422 with every issue, 410 when the signal aborted
 */
export async function liveCurve(
  { materials: store, pool }: Live,
  { document, axis, readings: asked, strip = false }: LiveCurveRequest,
  groupIds: Iterable<string>,
  signal: AbortSignal,
): Promise<Buffer> {
  const materials = await loadChecked(store, document, { axis }, groupIds);
  const readings = [...new Set(asked)];
  const curve = await explained(document, () =>
    pool.liveCurve({ document, axis, readings }, materials, { strip, signal }),
  );
  const header = describeResult({ axis }, readings, {
    solverVersion: SOLVER_VERSION,
    inputSha256: hashOf({ document, axis, readings, materials: materials.map(nameOf) }),
  });
  return Buffer.concat([
    encodeResultHeader(curve.strip ? { ...header, strip: curve.strip } : header),
    ...[curve.axis, ...curve.columns].map(
      (column) => new Uint8Array(column.buffer, column.byteOffset, column.byteLength),
    ),
  ]);
}

/** @throws Refusal as `liveCurve` */
export async function findAngleFeatures(
  { materials: store, pool }: Live,
  document: StackDocument,
  groupIds: Iterable<string>,
): Promise<AngleFeatures> {
  const materials = await loadChecked(store, document, { axis: ALL_ANGLES }, groupIds);
  return explained(document, () => pool.angleFeatures(document, materials));
}

async function loadChecked(
  store: Dependencies['materials'],
  document: StackDocument,
  axes: SweepAxes,
  groupIds: Iterable<string>,
): Promise<LoadedMaterial[]> {
  const issues = checkRunDocument(document, axes);
  if (issues.length > 0) throw invalid(issues);
  const given = runCase(document, document.workingPoint.wavelengthNm);
  return [...(await store.loadFor([given], groupIds)).values()];
}

/** What the thread refuses, said of the fields of the document. */
async function explained<Value>(document: StackDocument, work: () => Promise<Value>): Promise<Value> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof ComputeError)) throw error;
    if (error.failure === 'cancelled') throw gone('The curve was dropped because nobody waited for it.');
    if (error.issues.length > 0) throw invalid(toDocumentIssues(error.issues, document));
    throw error;
  }
}

/** A version of a material never changes, so that its name stands for its constants. */
function nameOf({ id, version }: LoadedMaterial) {
  return { id, version };
}

function hashOf(input: object): string {
  return createHash('sha256').update(JSON.stringify(input)).digest('hex');
}
