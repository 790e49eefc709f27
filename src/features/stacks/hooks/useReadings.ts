import { useMemo } from 'react';
import { readStrip, stripRequest } from '../../../../shared/readingsStrip.ts';
import type { ReadingsStrip, StripReadings } from '../../../../shared/readingsStrip.ts';
import type { LibrarySolveRequest, SolveWarning } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { useChangedLast } from '../../../lib/useChangedLast.ts';
import { useLatest } from '../../../lib/useLatest.ts';
import { solve } from '../api/solve.ts';
import type { LiveSweep } from './useSweep.ts';

export type LiveReadings = {
  /** The last readings there were; null before the first. */
  readings: StripReadings | null;
  /** Whether they are of an earlier state of the film than the one on the page. */
  pending: boolean;
  error: Error | null;
  warnings: readonly SolveWarning[];
};

/**
 * The readings at the working point, solved anew as the film changes: by themselves, unless the curve brings them along.
 *
 * @param sweep the sweep of the same film at the same point
 */
export function useReadings(document: StackDocument, point: WorkingPoint, sweep: LiveSweep): LiveReadings {
  // A curve may fail where the point does not, as beyond the constants of a material.
  const alone = !sweep.bringsStrip || sweep.error !== null;
  const question = useMemo(() => (alone ? stripRequest(document, point) : null), [alone, document, point]);
  const { answer, pending, error } = useLatest(question, solveStrip);
  const strip = useChangedLast(sweep.strip, answer);
  const awaited = alone ? pending : sweep.pending;
  return useMemo(
    () => ({
      readings: strip?.readings ?? null,
      pending: awaited,
      error,
      warnings: strip?.warnings ?? noWarnings,
    }),
    [strip, awaited, error],
  );
}

const noWarnings: readonly SolveWarning[] = [];

async function solveStrip(question: LibrarySolveRequest, signal: AbortSignal): Promise<ReadingsStrip> {
  return readStrip(await solve(question, signal));
}
