import type { Run } from '../../../../shared/run.ts';
import { Button } from '../../../components/Button.tsx';
import { Progress } from '../../../components/Progress.tsx';
import { formatCount } from '../../../lib/format.ts';
import { useCancelRun } from '../api/changeRun.ts';

type Props = { run: Run; mayEdit: boolean; onRerun: () => void; rerunning: boolean };

/** Where a run stands that has no values to show: waiting, running, failed or cancelled. */
export function RunState({ run, mayEdit, onRerun, rerunning }: Props) {
  const cancel = useCancelRun(run);
  const { state, done, total, secondsLeft, error } = run.progress;
  if (state === 'queued' || state === 'running') {
    return (
      <div className="card px-5 py-5">
        <Progress
          label={state === 'queued' ? 'Waiting for a free machine' : 'Computing'}
          done={done}
          total={total}
          secondsLeft={secondsLeft}
          onCancel={mayEdit ? () => cancel.mutate() : undefined}
          cancelling={cancel.isPending || cancel.isSuccess}
        />
        <p className="mt-3 text-note text-muted">
          You can leave this page or reload it: the run goes on, and the values are here when it is done.
        </p>
        {cancel.error && (
          <p role="alert" className="mt-2 text-note text-danger">
            Not cancelled: {cancel.error.message}
          </p>
        )}
      </div>
    );
  }
  const failed = state === 'failed';
  return (
    <div role="alert" className={`card px-5 py-5 ${failed ? 'border-danger!' : ''}`}>
      <p className={`font-semibold ${failed ? 'text-danger' : ''}`}>
        {failed ? 'The run failed' : 'The run was cancelled'}
      </p>
      <p className="mt-1 text-muted">
        {failed
          ? (error ?? 'No reason was recorded.')
          : `It was stopped after ${formatCount(done)} of ${formatCount(total)} points; no values were kept.`}
      </p>
      {mayEdit && (
        <Button tone="primary" className="mt-3" busy={rerunning} onClick={onRerun}>
          Run it again
        </Button>
      )}
    </div>
  );
}
