import { useQuery } from '@tanstack/react-query';
import { generatePath } from 'react-router-dom';
import type { StudyItem } from '../../../shared/study.ts';
import { LoadingState } from '../../components/LoadingState.tsx';
import { designQuery } from '../../features/designs/api/design.ts';
import { runQuery } from '../../features/runs/api/run.ts';
import { ApiError } from '../../lib/apiClient.ts';
import { paths } from '../../lib/paths.ts';
import { PinnedDesign } from './PinnedDesign.tsx';
import { PinnedRun } from './PinnedRun.tsx';

type Pinned = Exclude<StudyItem, { kind: 'note' }>;

/** A pinned run or design for members of the group. */
export function MemberItem({ item }: { item: Pinned }) {
  return item.kind === 'run' ? <MemberRun item={item} /> : <MemberDesign item={item} />;
}

function MemberRun({ item: { runId, view } }: { item: Extract<Pinned, { kind: 'run' }> }) {
  const run = useQuery(runQuery(runId));
  const page = generatePath(paths.run, { runId });
  if (!run.data) return <Waiting what="run" error={run.error} />;
  if (run.data.progress.state !== 'done') return <NotDone what="run" state={run.data.progress.state} />;
  return <PinnedRun run={run.data} dataPath={`/runs/${runId}`} view={view} href={withView(page, view)} />;
}

function MemberDesign({ item: { designId, view } }: { item: Extract<Pinned, { kind: 'design' }> }) {
  const design = useQuery(designQuery(designId));
  const page = generatePath(paths.design, { designId });
  if (!design.data) return <Waiting what="design" error={design.error} />;
  if (design.data.progress.state !== 'done')
    return <NotDone what="design" state={design.data.progress.state} />;
  return (
    <PinnedDesign
      design={design.data}
      dataPath={`/designs/${designId}`}
      view={view}
      href={withView(page, view)}
    />
  );
}

function withView(page: string, view: string): string {
  return view === '' ? page : `${page}?${view}`;
}

function Waiting({ what, error }: { what: string; error: Error | null }) {
  if (!error) return <LoadingState label={`Opening the ${what}`} rows={6} />;
  const gone = error instanceof ApiError && error.status === 404;
  return (
    <p className="text-muted">
      {gone ? `This ${what} was deleted. Remove it here, or leave its caption as a record.` : error.message}
    </p>
  );
}

function NotDone({ what, state }: { what: string; state: string }) {
  return (
    <p className="text-muted">
      This {what} has no values ({state}). They appear here once it is done.
    </p>
  );
}
