import type { Design } from '../../../../shared/design.ts';
import { Button } from '../../../components/Button.tsx';
import { Progress } from '../../../components/Progress.tsx';
import { formatCount } from '../../../lib/format.ts';
import { useCancelDesign } from '../api/changeDesign.ts';

type Props = { design: Design; mayEdit: boolean; onRerun: () => void; rerunning: boolean };

/** Where a design stands that has no answer yet: waiting, running, failed or cancelled. */
export function DesignState({ design, mayEdit, onRerun, rerunning }: Props) {
  const cancel = useCancelDesign(design.groupId);
  const { state, done, total, secondsLeft, error } = design.progress;
  if (state === 'queued' || state === 'running') {
    return (
      <div className="card px-5 py-5">
        <Progress
          label={state === 'queued' ? 'Waiting for a free machine' : 'Computing'}
          done={done}
          total={total}
          noun="films"
          secondsLeft={secondsLeft}
          onCancel={mayEdit ? () => cancel.mutate(design.id) : undefined}
          cancelling={cancel.isPending || cancel.isSuccess}
        />
        <p className="mt-3 text-note text-muted">
          You can leave this page or reload it: the work goes on, and the answer is here when it is done.
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
        {failed ? 'The calculation failed' : 'The calculation was cancelled'}
      </p>
      <p className="mt-1 text-muted">
        {failed
          ? (error ?? 'No reason was recorded.')
          : `It was stopped after ${formatCount(done)} of ${formatCount(total)} films; no answer was kept.`}
      </p>
      {mayEdit && (
        <Button tone="primary" className="mt-3" busy={rerunning} onClick={onRerun}>
          Run it again
        </Button>
      )}
    </div>
  );
}
