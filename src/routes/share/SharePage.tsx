import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link, generatePath, useNavigate, useParams } from 'react-router-dom';
import { pointCountOf } from '../../../shared/runAxes.ts';
import type { SharedRun } from '../../../shared/run.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { mayEdit, useSession } from '../../features/session/hooks/useSession.ts';
import { sharedPath, sharedRunQuery } from '../../features/sharing/api/sharedRun.ts';
import { OpenInGroup } from '../../features/sharing/components/OpenInGroup.tsx';
import { ApiError } from '../../lib/apiClient.ts';
import { formatCount, formatDateTime } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { StoredRun } from '../run/StoredRun.tsx';

/** `/share/:token`: a run for a reader without an account. It says nothing of the group that shared it. */
export function SharePage() {
  const { token = '' } = useParams();
  const shared = useQuery(sharedRunQuery(token));
  if (shared.data) return <OpenShare token={token} run={shared.data} />;
  if (shared.error) return <ClosedShare error={shared.error} onRetry={() => void shared.refetch()} />;
  return (
    <Page title="Shared run">
      <LoadingState label="Opening the shared run" rows={8} />
    </Page>
  );
}

function OpenShare({ token, run }: { token: string; run: SharedRun }) {
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

/** A link that no longer opens is an answer, not a failure; anything else can be tried again. */
function ClosedShare({ error, onRetry }: { error: Error; onRetry: () => void }) {
  const status = error instanceof ApiError ? error.status : 0;
  if (status === 410) {
    return (
      <Closed title="This link no longer opens">
        It was revoked by the group that made it, or it has expired. The run itself may still exist: ask the
        person who sent you the link for a new one.
      </Closed>
    );
  }
  if (status === 404) {
    return (
      <Closed title="There is no such link">
        The address may have been cut off when it was copied. A share link ends in a long row of letters and
        digits; check that all of it is there, or ask for it again.
      </Closed>
    );
  }
  return (
    <Page title="Shared run" width="text">
      <ErrorState title="The shared run could not be opened" error={error} onRetry={onRetry} />
    </Page>
  );
}

function Closed({ title, children }: { title: string; children: ReactNode }) {
  return (
    <Page title={title} width="text">
      <p className="max-w-prose text-muted">{children}</p>
      <p className="mt-4">
        <Link className="prose-link" to={paths.conventions}>
          What Skewlight computes, and its conventions
        </Link>
      </p>
    </Page>
  );
}
