import type { Issue } from '../../shared/error.ts';
import { LIMITS } from '../../shared/limits.ts';
import { readStrip, stripRequest } from '../../shared/readingsStrip.ts';
import type { ReadingsStrip } from '../../shared/readingsStrip.ts';
import { checkSolveRequest } from '../../shared/solveRules.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { solveRequest } from '../optics/solveRequest.ts';
import { resolveCases } from '../resolveCases.ts';
import { SharedResult } from './sharedResult.ts';
import { materialKey } from './sweepInput.ts';
import type { SweepInput } from './sweepInput.ts';
import { SweepSolver } from './sweepSolver.ts';

/** A material as JSON in UTF-8, which threads share: a table is read once in each, however many curves use it. */
export type SharedMaterial = { serial: number; bytes: SharedArrayBuffer };

export type LiveCurveTask = {
  sweep: Omit<SweepInput, 'materials' | 'second' | 'family'>;
  materials: SharedMaterial[];
  result: SharedArrayBuffer;
  /** Whether the readings at the working point are wanted too. */
  strip: boolean;
};

/** Materials that this thread has read, the one used last at the end. */
const known = new Map<number, ResolvableMaterial>();
const MOST_KNOWN = 32;

/** Fails with issues at fields of the solve case, as a refused run does. */
class LiveCurveError extends Error {
  override readonly name = 'LiveCurveError';

  constructor(readonly issues: Issue[]) {
    super(issues.map(({ path, message }) => `${path}: ${message}`).join('; '));
  }
}

/**
 * One curve into the shared columns. Returns early, with columns half filled, once the result is cancelled.
 *
 * @returns the readings at the working point, where they were asked for
 * @throws ResolutionError, LiveCurveError with every issue of the case
 */
export function liveCurve({ sweep, materials, result, strip }: LiveCurveTask): ReadingsStrip | null {
  const { axis, readings } = sweep;
  const shared = new SharedResult(result, axis.points, readings.length);
  if (shared.cancelled) return null;
  const input = { ...sweep, materials: materials.map(readMaterial) };
  checkResolved(input);
  new SweepSolver(input).solve(
    { first: { start: 0, count: axis.points }, second: { start: 0, stride: 1, count: 1 }, family: 0 },
    shared,
  );
  return strip && !shared.cancelled ? stripOf(input) : null;
}

function stripOf({ document, materials }: SweepInput): ReadingsStrip {
  const { cases } = stripRequest(document, document.workingPoint);
  return readStrip(solveRequest({ cases: resolveCases(cases, byKey(materials)) }));
}

/** What the library puts in must keep the rules too, such as an incident medium that does not absorb. */
function checkResolved({ document, axis, materials }: SweepInput): void {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  const ends = axis.kind === 'wavelength' && axis.points > 1 ? [axis.from, axis.to] : [wavelengthNm];
  const cases = resolveCases(
    ends.map((end) => toSolveCase(document, end, angleDeg)),
    byKey(materials),
  );
  const issues = checkSolveRequest({ cases }, { maxPoints: LIMITS.runPoints, beyond: '' });
  if (issues.length > 0) throw new LiveCurveError(issues);
}

function byKey(materials: readonly ResolvableMaterial[]): Map<string, ResolvableMaterial> {
  return new Map(materials.map((material) => [materialKey(material), material]));
}

export function readMaterial({ serial, bytes }: SharedMaterial): ResolvableMaterial {
  // Written by SharedMaterials from a ResolvableMaterial in this same process.
  const material =
    known.get(serial) ??
    (JSON.parse(new TextDecoder().decode(new Uint8Array(bytes).slice())) as ResolvableMaterial);
  known.delete(serial);
  known.set(serial, material);
  for (const oldest of known.keys()) {
    if (known.size <= MOST_KNOWN) break;
    known.delete(oldest);
  }
  return material;
}
