import type { SharedRun } from '../../../shared/run.ts';
import { pointCountOf } from '../../../shared/runAxes.ts';
import { Page } from '../../components/Page.tsx';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { sharedPath } from '../../features/sharing/api/sharedRun.ts';
import { formatCount, formatDateTime } from '../../lib/format.ts';
import { StoredRun } from '../run/StoredRun.tsx';
import { OpenFilm, SignInToOpen } from './OpenFilm.tsx';

/** A shared run: film, plot, values, everything they rest on. */
export function OpenRun({ token, run }: { token: string; run: SharedRun }) {
  const path = sharedPath(token);
  const count = pointCountOf(run);
  const points = `${formatCount(count)} ${count === 1 ? 'point' : 'points'}`;
  return (
    <Page
      title={run.name}
      subtitle={
        <>
          Shared run, {points}
          {run.finishedAt ? `, computed ${formatDateTime(run.finishedAt)}` : ''}. It stays as it was, whatever
          happens to the stack.
        </>
      }
      actions={<OpenFilm token={token} />}
    >
      <StoredRun run={run} dataPath={path} waiting={null}>
        <div className="mt-3 flex flex-col gap-7 border-t border-line pt-5">
          <RunProvenance run={run} />
          <RunDownloads path={path} hasData />
          <SignInToOpen token={token} />
        </div>
      </StoredRun>
    </Page>
  );
}
