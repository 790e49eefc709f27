import { formatCount, formatDuration } from '../lib/format.ts';
import { Button } from './Button.tsx';

type ProgressProps = {
  label: string;
  done: number;
  total: number;
  /** What is counted, in the plural. */
  noun?: string;
  /** Null while there is no rate to estimate from. */
  secondsLeft: number | null;
  onCancel?: (() => void) | undefined;
  cancelling?: boolean;
};

/** Long work: how far, how long still, and a way to stop it. */
export function Progress(props: ProgressProps) {
  const { label, done, total, noun = 'points', secondsLeft, onCancel, cancelling = false } = props;
  const share = total > 0 ? Math.min(1, done / total) : 0;
  const left =
    secondsLeft === null ? 'estimating the time left' : `about ${formatDuration(secondsLeft)} left`;
  return (
    <div className="flex flex-col gap-0.5">
      <div className="flex flex-wrap items-baseline gap-x-2.5">
        <span className="font-semibold">{label}</span>
        <span className="text-note text-muted">
          {formatCount(done)} of {formatCount(total)} {noun}, {cancelling ? 'stopping' : left}
        </span>
      </div>
      <div className="flex items-center gap-2">
        <div
          role="progressbar"
          aria-label={label}
          aria-valuemin={0}
          aria-valuemax={100}
          aria-valuenow={Math.round(share * 100)}
          aria-valuetext={`${Math.round(share * 100)} percent, ${left}`}
          className="h-1.5 flex-1 overflow-hidden rounded-full bg-line"
        >
          <div
            className="h-full rounded-full bg-accent transition-[width]"
            style={{ width: `${share * 100}%` }}
          />
        </div>
        {onCancel ? (
          <Button tone="plain" className="-my-1 px-2! py-1!" busy={cancelling} onClick={onCancel}>
            Cancel
          </Button>
        ) : null}
      </div>
    </div>
  );
}
