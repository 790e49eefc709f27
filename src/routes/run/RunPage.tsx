import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, generatePath, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { pointCountOf } from '../../../shared/runAxes.ts';
import type { Run } from '../../../shared/run.ts';
import { Button } from '../../components/Button.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { useRerun } from '../../features/runs/api/changeRun.ts';
import { runQuery } from '../../features/runs/api/run.ts';
import { Comparison } from '../../features/runs/components/Comparison.tsx';
import { DeleteRun } from '../../features/runs/components/DeleteRun.tsx';
import { RunDownloads } from '../../features/runs/components/RunDownloads.tsx';
import { RunProvenance } from '../../features/runs/components/RunProvenance.tsx';
import { RunState } from '../../features/runs/components/RunState.tsx';
import { useRunProgress } from '../../features/runs/hooks/useRunProgress.ts';
import { mayEdit, useMembership } from '../../features/session/hooks/useSession.ts';
import { PinToStudy } from '../../features/studies/components/PinToStudy.tsx';
import { SharePanel } from '../../features/sharing/components/SharePanel.tsx';
import { formatCount, formatDateTime } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { rememberGroup } from '../../lib/rememberedGroup.ts';
import { StoredRun } from './StoredRun.tsx';

/** `/runs/:runId`: progress while it runs, then its values and everything they rest on. */
export function RunPage() {
  const { runId = '' } = useParams();
  const run = useQuery(runQuery(runId));
  useRunProgress(run.data);
  const groupId = run.data?.groupId;
  useEffect(() => {
    if (groupId !== undefined) rememberGroup(groupId);
  }, [groupId]);

  if (run.data) return <LoadedRun key={runId} run={run.data} />;
  return (
    <Page title="Run">
      {run.error ? (
        <ErrorState
          title="The run could not be opened"
          error={run.error}
          onRetry={() => void run.refetch()}
        />
      ) : (
        <LoadingState label="Opening the run" rows={8} />
      )}
    </Page>
  );
}

function LoadedRun({ run }: { run: Run }) {
  const editor = mayEdit(useMembership(run.groupId));
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const rerun = useRerun(run);
  const done = run.progress.state === 'done';
  const compareWith = search.get('compare');
  const path = `/runs/${run.id}`;
  const startRerun = () =>
    rerun.mutate(undefined, {
      onSuccess: (made) => {
        const to = generatePath(paths.run, { runId: made.id });
        void navigate(done ? `${to}?compare=${run.id}` : to);
      },
    });

  return (
    <Page
      title={run.name}
      subtitle={<RunLine run={run} />}
      actions={
        editor && (
          <>
            {done && (
              <PinToStudy
                groupId={run.groupId}
                pinned={{ kind: 'run', runId: run.id }}
                view={pinnedView(search)}
                name={run.name}
              />
            )}
            {done && (
              <Button
                busy={rerun.isPending}
                onClick={startRerun}
                title="Compute the same input again and compare"
              >
                Rerun with today’s solver
              </Button>
            )}
            <DeleteRun
              run={run}
              onDeleted={() => void navigate(generatePath(paths.runs, { groupId: run.groupId }))}
            />
          </>
        )
      }
    >
      {rerun.error && (
        <p role="alert" className="mb-3 text-danger">
          Not started: {rerun.error.message}
        </p>
      )}
      <StoredRun
        run={run}
        dataPath={done ? path : null}
        partialPath={run.progress.state === 'running' && run.second ? path : null}
        waiting={<RunState run={run} mayEdit={editor} onRerun={startRerun} rerunning={rerun.isPending} />}
        besideFilm={({ result, placeOf }) => (
          <div className="mt-6 flex flex-col gap-7">
            {compareWith && result && (
              <Comparison run={run} result={result} olderId={compareWith} placeOf={placeOf} />
            )}
            {editor && done && <SharePanel subject={{ opens: 'run', id: run.id }} />}
            <RunDownloads path={path} hasData={done} />
          </div>
        )}
      >
        <div className="mt-3 border-t border-line pt-5">
          <RunProvenance run={run} />
        </div>
      </StoredRun>
    </Page>
  );
}

/** What of the address says how the plot is shown. */
function pinnedView(search: URLSearchParams): string {
  const view = new URLSearchParams(search);
  view.delete('compare');
  return view.toString();
}

function RunLine({ run }: { run: Run }) {
  const count = pointCountOf(run);
  const points = `${formatCount(count)} ${count === 1 ? 'point' : 'points'}`;
  return (
    <>
      {run.stackId ? (
        <Link className="prose-link" to={generatePath(paths.stack, { stackId: run.stackId })}>
          {run.stackName ?? 'its stack'}
        </Link>
      ) : run.stackName === null ? (
        'not made from a saved stack'
      ) : (
        `${run.stackName}, a stack that was deleted`
      )}
      {`, ${points}, ${formatDateTime(run.createdAt)}`}
      {run.createdBy ? ` by ${run.createdBy}` : ''}
      {run.isDemo ? '. Demo.' : ''}
    </>
  );
}
