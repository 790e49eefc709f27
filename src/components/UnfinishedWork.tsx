import type { RunProgress } from '../../shared/run.ts';
import { formatCount } from '../lib/format.ts';
import { Button } from './Button.tsx';
import { Progress } from './Progress.tsx';

type UnfinishedWorkProps = {
  progress: RunProgress;
  /** What is counted, such as "points", and the work itself in words, such as "run". */
  words: { counted: string; work: string; answer: string };
  mayEdit: boolean;
  /** Whether what was found before the end is shown below; undefined until that is known. */
  kept: boolean | undefined;
  cancel: { isPending: boolean; isSuccess: boolean; error: Error | null };
  onCancel: () => void;
  onRerun: () => void;
  rerunning: boolean;
};

/** Where a calculation stands that has no answer: waiting, running, failed or cancelled. */
export function UnfinishedWork({
  progress,
  words,
  mayEdit,
  kept,
  cancel,
  onCancel,
  onRerun,
  rerunning,
}: UnfinishedWorkProps) {
  const { state, done, total, secondsLeft, error } = progress;
  if (state === 'queued' || state === 'running') {
    return (
      <div className="card px-5 py-5">
        <Progress
          label={state === 'queued' ? 'Waiting for a free machine' : 'Computing'}
          done={done}
          total={total}
          noun={words.counted}
          secondsLeft={secondsLeft}
          onCancel={mayEdit ? onCancel : undefined}
          cancelling={cancel.isPending || cancel.isSuccess}
        />
        <p className="mt-3 text-note text-muted">
          You can leave this page or reload it: the {words.work} goes on, and you find the {words.answer} here
          when it is done.
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
  const rest = kept ? '; what it had found by then is below' : kept === false ? '; nothing was kept' : '';
  return (
    <div role="alert" className={`card px-5 py-5 ${failed ? 'border-danger!' : ''}`}>
      <p className={`font-semibold ${failed ? 'text-danger' : ''}`}>
        The {words.work} {failed ? 'failed' : 'was cancelled'}
      </p>
      <p className="mt-1 text-muted">
        {failed
          ? (error ?? 'No reason was recorded.')
          : `It was stopped after ${formatCount(done)} of ${formatCount(total)} ${words.counted}${rest}.`}
      </p>
      {failed && kept && (
        <p className="mt-1 text-muted">
          After {formatCount(done)} of {formatCount(total)} {words.counted}
          {rest}.
        </p>
      )}
      {mayEdit && (
        <Button tone="primary" className="mt-3" busy={rerunning} onClick={onRerun}>
          Run it again
        </Button>
      )}
    </div>
  );
}
