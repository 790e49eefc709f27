import { useEffect, useState } from 'react';
import type { PointerEvent as ReactPointerEvent } from 'react';

/** Pixels from the edge of the screen within which a drag scrolls the page. */
const EDGE = 80;
/** Pixels that the page scrolls in one frame at the very edge; items with plots are taller than the screen. */
const FASTEST = 40;

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
    let frame = 0;
    const follow = (y: number) => {
      cancelAnimationFrame(frame);
      const scroll = scrollAt(y, window.innerHeight);
      // Instantly: a page that is still on its way cannot be asked where its rows are.
      window.scrollBy({ top: scroll, behavior: 'instant' });
      before = rowBelow(list, y);
      setDragging({ id, before });
      // A pointer that rests at the edge goes on scrolling.
      if (scroll !== 0) frame = requestAnimationFrame(() => follow(y));
    };
    const onMove = (event: PointerEvent) => follow(event.clientY);
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
      cancelAnimationFrame(frame);
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

/** How far the page scrolls in one frame while the pointer is at `y`, px; faster nearer to the edge. */
function scrollAt(y: number, height: number): number {
  const past = (distance: number) => Math.min(Math.max((EDGE - distance) / EDGE, 0), 1);
  return Math.round(FASTEST * (past(height - y) - past(y)));
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
