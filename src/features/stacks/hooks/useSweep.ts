import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { sweepQuery } from '../api/solve.ts';
import { axisGrid, axisProblems, previewPoints } from '../model/sweepAxis.ts';
import { readSweepResponse, sweepRequest } from '../model/solveStates.ts';
import type { ReadingColumns, Sweep } from '../model/solveStates.ts';
import { useSettled } from './useSettled.ts';

/** Longer than that of the readings strip, which comes first. */
const PAUSE_MS = 110;

export type LiveSweep = {
  /** The last sweep there was: the axis and grid that its columns belong to. */
  drawn: { axis: SweepAxis; grid: readonly number[]; columns: ReadingColumns; seconds: number } | null;
  pending: boolean;
  error: Error | null;
};

/**
 * The preview of a sweep, solved anew as film, point and axis change.
 *
 * @param axis null while it cannot be swept
 */
export function useSweep(
  document: StackDocument,
  point: WorkingPoint,
  axis: SweepAxis | null,
  readings: readonly ReadingName[],
): LiveSweep {
  const asked = useMemo(() => {
    if (axis === null || Object.keys(axisProblems(axis)).length > 0) return null;
    const sweep: Sweep = { axis, grid: axisGrid(axis, previewPoints(axis, document)), readings };
    return { sweep, request: sweepRequest(document, point, sweep) };
  }, [document, point, axis, readings]);
  const settled = useSettled(asked, PAUSE_MS);
  const query = useQuery({ ...sweepQuery(settled), placeholderData: keepPreviousData, retry: false });
  const answer = query.data;
  const drawn = useMemo(
    () =>
      answer
        ? {
            axis: answer.sweep.axis,
            grid: answer.sweep.grid,
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
