import { formatNumber } from '../../../lib/format.ts';
import type { CeilingCell } from '../model/stripReadings.ts';
import { pendingLook } from './pendingLook.ts';
import { ReadingName } from './ReadingCell.tsx';

/** How much of the most that the magnet allows is reached, as number and bar; in words where there is no ceiling. */
export function CeilingReading({ ceiling, pending }: { ceiling: CeilingCell | null; pending: boolean }) {
  const percent = ceiling && 'percent' in ceiling ? ceiling.percent : null;
  return (
    <div className="min-w-0 border-line px-4 py-3 max-sm:border-t sm:border-l">
      <div className="flex">
        <ReadingName label="Share of the ceiling" anchor="ceiling" />
      </div>
      <div
        className={`mt-0.5 truncate text-reading font-[560] tracking-[-0.02em] ${pending ? pendingLook : ''}`}
      >
        {percent === null ? '–' : formatNumber(percent, { digits: 3 })}
        {percent !== null && (
          <span className="ml-1 text-[13px] font-normal tracking-normal text-muted">%</span>
        )}
      </div>
      {percent === null ? (
        <div className="text-small leading-tight text-muted">
          {ceiling && 'reason' in ceiling ? ceiling.reason : ''}
        </div>
      ) : (
        <div className="flex items-center gap-2 text-small whitespace-nowrap text-muted">
          <span aria-hidden="true" className="h-1.5 flex-1 overflow-hidden rounded-full bg-line">
            <span
              className="block h-full rounded-full bg-accent"
              style={{ width: `${Math.min(100, Math.max(percent, 0.5))}%` }}
            />
          </span>
          first order
        </div>
      )}
    </div>
  );
}
