import { useMemo } from 'react';
import type { LibrarySolveRequest, SolveWarning } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { useLatest } from '../../../lib/useLatest.ts';
import { solve } from '../api/solve.ts';
import { pointRequest, readPointResponse } from '../model/solveStates.ts';
import type { PointReadings } from '../model/solveStates.ts';

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
  const question = useMemo(() => pointRequest(document, point), [document, point]);
  const { answer, pending, error } = useLatest(question, solvePoint);
  return useMemo(
    () => ({ readings: answer?.readings ?? null, pending, error, warnings: answer?.warnings ?? noWarnings }),
    [answer, pending, error],
  );
}

const noWarnings: readonly SolveWarning[] = [];

async function solvePoint(question: LibrarySolveRequest, signal: AbortSignal) {
  const response = await solve(question, signal);
  return {
    readings: readPointResponse(response),
    // The three states say the same of the same media; what the film as given says is enough.
    warnings: (response.warnings ?? []).filter((warning) => warning.case === 0),
  };
}
