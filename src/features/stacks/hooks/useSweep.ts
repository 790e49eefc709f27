import { useMemo } from 'react';
import type { LiveCurveRequest } from '../../../../shared/live.ts';
import type { ReadingsStrip } from '../../../../shared/readingsStrip.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { LibrarySolveRequest } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { useLatest } from '../../../lib/useLatest.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { liveCurve } from '../api/liveCurve.ts';
import { solve } from '../api/solve.ts';
import { axesProblem } from '../model/axesProblem.ts';
import type { Materials } from '../model/media.ts';
import { curveRequest, isCurve, readSweepResponse, sweepRequest } from '../model/solveStates.ts';
import type { ReadingColumns, Sweep } from '../model/solveStates.ts';
import { axisGrid, axisProblems, previewGrid } from '../model/sweepAxis.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';

/** A map or a family is many solves: it waits until the film stands still. A curve is drawn at once. */
const PAUSE_MS = 110;

type DrawnSweep = Sweep & { columns: ReadingColumns; seconds: number; strip: ReadingsStrip | null };

export type LiveSweep = {
  /** The last sweep there was: the axes and grids that its columns belong to. */
  drawn: DrawnSweep | null;
  pending: boolean;
  error: Error | null;
  /** Whether the question that is asked now brings the readings at the working point along. */
  bringsStrip: boolean;
  /** Those that came with the last sweep. */
  strip: ReadingsStrip | null;
};

type Question = { sweep: Sweep } & (
  { curve: LiveCurveRequest; cases?: undefined } | { cases: LibrarySolveRequest; curve?: undefined }
);

/**
 * The preview of a sweep, solved anew as film, point and axes change.
 *
 * @param axes null while there is nothing to sweep
 */
export function useSweep(
  document: StackDocument,
  point: WorkingPoint,
  axes: PreviewAxes | null,
  readings: readonly ReadingName[],
  materials: Materials,
): LiveSweep {
  const asked = useMemo<Question | null>(() => {
    const sweep = axes && previewOf(axes, document, readings);
    if (!sweep) return null;
    return isCurve(sweep)
      ? { sweep, curve: curveRequest(document, point, sweep, materials) }
      : { sweep, cases: sweepRequest(document, point, sweep) };
  }, [document, point, axes, readings, materials]);
  const settled = useSettled(asked, PAUSE_MS);
  const question = asked?.curve ? asked : settled;
  const { answer, pending, error } = useLatest(question, solveSweep);
  const awaited = pending || question !== asked;
  const failed = question === asked ? error : null;
  const bringsStrip = asked?.curve?.strip === true;
  return useMemo(
    () => ({ drawn: answer, pending: awaited, error: failed, bringsStrip, strip: answer?.strip ?? null }),
    [answer, awaited, failed, bringsStrip],
  );
}

async function solveSweep(question: Question, signal: AbortSignal): Promise<DrawnSweep> {
  const start = performance.now();
  const { columns, strip } = question.curve
    ? await liveCurve(question.curve, signal)
    : { columns: readSweepResponse(await solve(question.cases, signal), question.sweep), strip: null };
  return { ...question.sweep, columns, strip, seconds: (performance.now() - start) / 1000 };
}

/** The sweep with as many points as a preview has; null while an axis cannot be swept. */
function previewOf(
  axes: PreviewAxes,
  document: StackDocument,
  readings: readonly ReadingName[],
): Sweep | null {
  const { axis, second, family } = axes;
  const all = [axis, second, family].filter((one) => one !== null);
  if (all.some((one) => Object.keys(axisProblems(one)).length > 0) || axesProblem(axes)) return null;
  const points = previewGrid(axes, document);
  const gridded = (one: typeof axis, count: number) => ({ axis: one, grid: axisGrid(one, count) });
  return {
    ...gridded(axis, points.axis),
    readings,
    ...(second ? { second: gridded(second, points.second) } : {}),
    ...(family ? { family: gridded(family, family.points) } : {}),
  };
}
