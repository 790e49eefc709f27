import { Ban, Check, CircleAlert, Clock } from 'lucide-react';
import type { ReactNode } from 'react';
import type { RunSummary } from '../../../../shared/run.ts';
import { Progress } from '../../../components/Progress.tsx';

type RunStateCellProps = {
  run: Pick<RunSummary, 'progress'>;
  /** What is counted, in the plural. */
  noun?: string;
  /** Absent for people who may not cancel. */
  onCancel: (() => void) | undefined;
  cancelling: boolean;
};

const icon = 'size-3.5 shrink-0';

/** How a run stands: a word with a mark, or its progress while it is computed. */
export function RunStateCell({ run, noun = 'points', onCancel, cancelling }: RunStateCellProps) {
  const { state, done, total, secondsLeft, error } = run.progress;
  switch (state) {
    case 'queued':
      return (
        <Mark icon={<Clock aria-hidden="true" className={icon} />} look="text-muted">
          waiting for a free worker
        </Mark>
      );
    case 'running':
      return (
        <div className="min-w-0 flex-1 md:min-w-64">
          <Progress
            label="Computing"
            done={done}
            total={total}
            noun={noun}
            secondsLeft={secondsLeft}
            onCancel={onCancel}
            cancelling={cancelling}
          />
        </div>
      );
    case 'done':
      return <Mark icon={<Check aria-hidden="true" className={icon} />}>done</Mark>;
    case 'failed':
      return (
        <div>
          <Mark icon={<CircleAlert aria-hidden="true" className={icon} />} look="text-danger">
            failed
          </Mark>
          {error ? <p className="line-clamp-2 max-w-80 text-note text-muted">{error}</p> : null}
        </div>
      );
    case 'cancelled':
      return (
        <Mark icon={<Ban aria-hidden="true" className={icon} />} look="text-muted">
          cancelled
        </Mark>
      );
  }
}

function Mark({ icon: mark, look = '', children }: { icon: ReactNode; look?: string; children: string }) {
  return (
    <span className={`inline-flex items-center gap-1.5 whitespace-nowrap ${look}`}>
      {mark}
      {children}
    </span>
  );
}
