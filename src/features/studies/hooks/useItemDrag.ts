import { useEffect, useState } from 'react';
import type { PointerEvent as ReactPointerEvent } from 'react';

/** Pixels from the edge of the screen within which a drag scrolls the page. */
const EDGE = 60;

type Dragging = { id: string; before: number | null };

/**
 * Dragging an item by its handle. The rows of the list carry `data-row`. Escape lets go without a change.
 *
 * @param onDrop the item and the row before which it was let go (the number of rows for the end)
 */
export function useItemDrag(onDrop: (id: string, before: number) => void) {
  const [list, setList] = useState<HTMLElement | null>(null);
  const [dragging, setDragging] = useState<Dragging | null>(null);
  const id = dragging?.id;

  useEffect(() => {
    if (id === undefined) return;
    let before: number | null = null;
    const onMove = (event: PointerEvent) => {
      if (event.clientY < EDGE) window.scrollBy(0, -12);
      if (event.clientY > window.innerHeight - EDGE) window.scrollBy(0, 12);
      before = rowBelow(list, event.clientY);
      setDragging({ id, before });
    };
    const end = () => setDragging(null);
    const onUp = () => {
      end();
      if (before !== null) onDrop(id, before);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape') end();
    };
    window.addEventListener('pointermove', onMove);
    window.addEventListener('pointerup', onUp);
    window.addEventListener('pointercancel', end);
    window.addEventListener('keydown', onKey);
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('pointerup', onUp);
      window.removeEventListener('pointercancel', end);
      window.removeEventListener('keydown', onKey);
    };
  }, [id, list, onDrop]);

  const start = (itemId: string) => (event: ReactPointerEvent) => {
    if (event.button !== 0) return;
    event.preventDefault();
    setDragging({ id: itemId, before: null });
  };
  return { setList, draggedId: id ?? null, before: dragging?.before ?? null, start };
}

/** The first row whose middle lies below the pointer. */
function rowBelow(list: HTMLElement | null, y: number): number {
  const rows = [...(list?.querySelectorAll<HTMLElement>('[data-row]') ?? [])];
  const found = rows.findIndex((row) => {
    const { top, bottom } = row.getBoundingClientRect();
    return y < (top + bottom) / 2;
  });
  return found < 0 ? rows.length : found;
}
