import { useMemo, useState } from 'react';
import { readStrip, stripRequest } from '../../../../shared/readingsStrip.ts';
import type { ReadingsStrip, StripReadings } from '../../../../shared/readingsStrip.ts';
import type { LibrarySolveRequest, SolveWarning } from '../../../../shared/solve.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
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
  const strip = useStripOf(alone, alone ? answer : sweep.strip);
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

/**
 * The last strip of the source that is asked now. When the source changes, what the new one had before is of an earlier
 * film: what was shown stays until it brings another.
 */
function useStripOf(alone: boolean, current: ReadingsStrip | null): ReadingsStrip | null {
  const [held, setHeld] = useState({ alone, old: null as ReadingsStrip | null, shown: current });
  if (alone !== held.alone) {
    setHeld({ alone, old: current, shown: held.shown });
    return held.shown;
  }
  if (current === null || current === held.old || current === held.shown) return held.shown;
  setHeld({ ...held, shown: current });
  return current;
}

async function solveStrip(question: LibrarySolveRequest, signal: AbortSignal): Promise<ReadingsStrip> {
  return readStrip(await solve(question, signal));
}
