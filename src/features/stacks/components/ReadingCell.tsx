import { memo } from 'react';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { pendingLook } from './pendingLook.ts';

type Props = {
  label: string;
  /** Place of its definition on the conventions page. */
  anchor: string;
  mark?: ReactNode;
  value: string | null;
  unit: string;
  /** The same reading for the other light, without its unit. */
  other: string;
  pending: boolean;
};

/** Apart, because a link takes longer to draw than the numbers that change under it. */
export const ReadingName = memo(function ReadingName({ label, anchor }: Pick<Props, 'label' | 'anchor'>) {
  return (
    <Link
      to={`${paths.conventions}#${anchor}`}
      className="truncate text-small text-muted no-underline hover:text-accent hover:underline"
    >
      {label}
    </Link>
  );
});

/** One reading of the strip: its name leads to its definition. */
export function ReadingCell({ label, anchor, mark, value, unit, other, pending }: Props) {
  return (
    <div className="min-w-0 border-line px-4 py-3 not-first:border-l max-sm:not-first:border-t max-sm:not-first:border-l-0">
      <div className="flex items-center gap-1.5 text-small text-muted">
        {mark}
        <ReadingName label={label} anchor={anchor} />
      </div>
      <div
        className={`mt-0.5 truncate text-reading font-[560] tracking-[-0.02em] ${pending ? pendingLook : ''}`}
      >
        {value ?? '–'}
        {value !== null && unit && (
          <span className="ml-1 text-[13px] font-normal tracking-normal text-muted">{unit}</span>
        )}
      </div>
      <div className="truncate text-small text-muted">{other}</div>
    </div>
  );
}
