import { GripVertical } from 'lucide-react';
import type { PointerEvent } from 'react';

/** What an item is dragged by; the arrow keys with Alt do the same. */
export function Handle({
  id,
  label,
  onGrab,
}: {
  id: string;
  label: string;
  onGrab: (id: string) => (event: PointerEvent) => void;
}) {
  return (
    <button
      type="button"
      data-handle={id}
      aria-label={`Move ${label}`}
      aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown"
      title="Drag into order, or Alt with the arrow keys"
      onPointerDown={onGrab(id)}
      className="-mr-1 inline-flex h-6 w-4 shrink-0 cursor-grab touch-none items-center justify-center rounded-box text-ink opacity-60 group-hover:opacity-100 focus-visible:opacity-100"
    >
      <GripVertical size={13} aria-hidden />
    </button>
  );
}
