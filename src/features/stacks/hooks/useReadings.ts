import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { SolveWarning } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { solveQuery } from '../api/solve.ts';
import { pointRequest, readPointResponse } from '../model/solveStates.ts';
import type { PointReadings } from '../model/solveStates.ts';
import { useSettled } from '../../../lib/useSettled.ts';

/** A pause in typing after which the film is solved; together with the solve it stays under 150 ms. */
const PAUSE_MS = 40;

export type LiveReadings = {
  /** The last readings there were; null before the first. */
  readings: PointReadings | null;
  /** Whether they are of an earlier state of the film than the one on the page. */
  pending: boolean;
  error: Error | null;
  warnings: readonly SolveWarning[];
};

/** The readings at the working point, solved anew as the film changes. */
export function useReadings(document: StackDocument, point: WorkingPoint): LiveReadings {
  const request = useMemo(() => pointRequest(document, point), [document, point]);
  const settled = useSettled(request, PAUSE_MS);
  const query = useQuery({ ...solveQuery(settled), placeholderData: keepPreviousData, retry: false });
  const response = query.data?.response;
  const readings = useMemo(() => (response ? readPointResponse(response) : null), [response]);
  return {
    readings,
    pending: settled !== request || query.isFetching,
    error: settled === request ? query.error : null,
    // The three states say the same of the same media; what the film as given says is enough.
    warnings: useMemo(() => (response?.warnings ?? []).filter((warning) => warning.case === 0), [response]),
  };
}
