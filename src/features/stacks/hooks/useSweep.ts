import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { ReadingName } from '../../../../shared/run.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { sweepQuery } from '../api/solve.ts';
import { axesProblem } from '../model/axesProblem.ts';
import { readSweepResponse, sweepRequest } from '../model/solveStates.ts';
import type { ReadingColumns, Sweep } from '../model/solveStates.ts';
import { axisGrid, axisProblems, previewGrid } from '../model/sweepAxis.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';
import { useSettled } from '../../../lib/useSettled.ts';

/** Longer than that of the readings strip, which comes first. */
const PAUSE_MS = 110;

export type LiveSweep = {
  /** The last sweep there was: the axes and grids that its columns belong to. */
  drawn: (Sweep & { columns: ReadingColumns; seconds: number }) | null;
  pending: boolean;
  error: Error | null;
};

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
): LiveSweep {
  const asked = useMemo(() => {
    const sweep = axes && previewOf(axes, document, readings);
    return sweep && { sweep, request: sweepRequest(document, point, sweep) };
  }, [document, point, axes, readings]);
  const settled = useSettled(asked, PAUSE_MS);
  const query = useQuery({ ...sweepQuery(settled), placeholderData: keepPreviousData, retry: false });
  const answer = query.data;
  const drawn = useMemo(
    () =>
      answer
        ? {
            ...answer.sweep,
            columns: readSweepResponse(answer.response, answer.sweep),
            seconds: answer.seconds,
          }
        : null,
    [answer],
  );
  return {
    drawn,
    pending: settled !== asked || query.isFetching,
    error: settled === asked ? query.error : null,
  };
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
