import { ArrowDown, ArrowUp, GripVertical, X } from 'lucide-react';
import type { PointerEvent, ReactNode } from 'react';
import { IconButton } from '../../../components/Button.tsx';

type Edit = {
  onMove: (step: -1 | 1) => void;
  onDragStart: (event: PointerEvent) => void;
  onRemove: () => void;
};

type Props = { name: string; number: number; count: number; edit?: Edit; children: ReactNode };

const icon = 'size-4';

/** One item of a study with the controls that order it. */
export function ItemFrame({ name, number, count, edit, children }: Props) {
  return (
    <section aria-label={`${number}. ${name}`} className="card px-4 py-3">
      {edit && (
        <div data-screen-only className="mb-1 flex items-center gap-0.5">
          <span
            aria-hidden="true"
            title="Drag to another place"
            onPointerDown={edit.onDragStart}
            className="-ml-2 inline-flex size-8 cursor-grab touch-none items-center justify-center text-muted"
          >
            <GripVertical className={icon} />
          </span>
          <span className="min-w-0 flex-1 truncate text-note text-muted">
            {number} of {count}
          </span>
          <IconButton
            label={`Move ${name} up`}
            data-move="-1"
            disabled={number === 1}
            onClick={() => edit.onMove(-1)}
          >
            <ArrowUp aria-hidden="true" className={icon} />
          </IconButton>
          <IconButton
            label={`Move ${name} down`}
            data-move="1"
            disabled={number === count}
            onClick={() => edit.onMove(1)}
          >
            <ArrowDown aria-hidden="true" className={icon} />
          </IconButton>
          <IconButton label={`Remove ${name}`} onClick={edit.onRemove}>
            <X aria-hidden="true" className={icon} />
          </IconButton>
        </div>
      )}
      {children}
    </section>
  );
}
