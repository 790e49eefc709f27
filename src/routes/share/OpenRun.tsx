import { Link, generatePath, useNavigate } from 'react-router-dom';
import type { SharedRun } from '../../../shared/run.ts';
import { pointCountOf } from '../../../shared/runAxes.ts';
import { Page } from '../../components/Page.tsx';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { mayEdit, useSession } from '../../features/session/hooks/useSession.ts';
import { sharedPath } from '../../features/sharing/api/sharedRun.ts';
import { OpenInGroup } from '../../features/sharing/components/OpenInGroup.tsx';
import { formatCount, formatDateTime } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { StoredRun } from '../run/StoredRun.tsx';

/** A shared run: film, plot, values, everything they rest on. */
export function OpenRun({ token, run }: { token: string; run: SharedRun }) {
  const session = useSession();
  const navigate = useNavigate();
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
      actions={
        session ? (
          <OpenInGroup
            token={token}
            groups={session.groups.filter(mayEdit)}
            onOpened={({ id }) => void navigate(generatePath(paths.stack, { stackId: id }))}
          />
        ) : null
      }
    >
      <StoredRun run={run} dataPath={path} waiting={null}>
        <div className="mt-3 flex flex-col gap-7 border-t border-line pt-5">
          <RunProvenance run={run} />
          <RunDownloads path={path} hasData />
          {!session && (
            <p className="text-note text-muted">
              <Link
                className="prose-link"
                to={`${paths.signIn}?return=${encodeURIComponent(`/share/${token}`)}`}
              >
                Sign in
              </Link>{' '}
              to open this film in a group of your own and change it.
            </p>
          )}
        </div>
      </StoredRun>
    </Page>
  );
}
