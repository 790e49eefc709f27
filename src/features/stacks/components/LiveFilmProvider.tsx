import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useReadings } from '../hooks/useReadings.ts';
import { useSweep } from '../hooks/useSweep.ts';
import type { Materials } from '../model/media.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';
import { LiveFilmContext } from './liveFilm.ts';

type Props = {
  document: StackDocument;
  point: WorkingPoint;
  axes: PreviewAxes | null;
  readings: readonly ReadingName[];
  materials: Materials;
  saveIssues: readonly Issue[];
  children: ReactNode;
};

/**
 * Asks for readings and sweep as the film changes. Answers come many times a second while somebody drags: they stand
 * in a context, so that only what shows them is drawn anew.
 */
export function LiveFilmProvider(props: Props) {
  const { document, point, axes, readings, materials, saveIssues, children } = props;
  const sweep = useSweep(document, point, axes, readings, materials);
  const live = useReadings(document, point, sweep);
  const solveIssues = live.error instanceof ApiError ? live.error.issues : noIssues;
  const issues = useMemo(() => [...solveIssues, ...saveIssues], [solveIssues, saveIssues]);
  const film = useMemo(() => ({ live, sweep, issues }), [live, sweep, issues]);
  return <LiveFilmContext value={film}>{children}</LiveFilmContext>;
}

const noIssues: readonly Issue[] = [];
