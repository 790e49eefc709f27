import { useCallback, useEffect, useState } from 'react';
import type { PointerEvent as ReactPointerEvent } from 'react';
import { dropTarget } from '../model/dropTarget.ts';
import type { DropRow, DropTarget } from '../model/dropTarget.ts';

type Dragging = { id: string; target: DropTarget | null };

/** Pixels from the edge of the screen within which a drag scrolls the page. */
const EDGE = 60;

/**
 * Dragging a layer or block by its handle. The rows of the drawing carry `data-drop-id` and `data-drop-kind`.
 * Escape lets go without a change.
 *
 * @param onDrop the item and where it was let go
 */
export function useLayerDrag(onDrop: (id: string, target: DropTarget) => void) {
  const [film, setFilm] = useState<HTMLElement | null>(null);
  const [dragging, setDragging] = useState<Dragging | null>(null);
  const id = dragging?.id;

  useEffect(() => {
    if (id === undefined) return;
    let target: DropTarget | null = null;
    const onMove = (event: PointerEvent) => {
      const box = film?.getBoundingClientRect();
      if (!box) return;
      if (event.clientY < EDGE) window.scrollBy(0, -12);
      if (event.clientY > window.innerHeight - EDGE) window.scrollBy(0, 12);
      const found = dropTarget(rowsOf(film, id), event.clientY);
      target = found;
      setDragging({ id, target: found && { ...found, y: found.y - box.top } });
    };
    const onUp = () => {
      setDragging(null);
      if (target) onDrop(id, target);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Escape') setDragging(null);
    };
    const onCancel = () => setDragging(null);
    window.addEventListener('pointermove', onMove);
    window.addEventListener('pointerup', onUp);
    window.addEventListener('pointercancel', onCancel);
    window.addEventListener('keydown', onKey);
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('pointerup', onUp);
      window.removeEventListener('pointercancel', onCancel);
      window.removeEventListener('keydown', onKey);
    };
  }, [id, film, onDrop]);

  const start = useCallback(
    (itemId: string) => (event: ReactPointerEvent) => {
      if (event.button !== 0) return;
      event.preventDefault();
      if (event.currentTarget instanceof HTMLElement) event.currentTarget.focus();
      setDragging({ id: itemId, target: null });
    },
    [],
  );

  return {
    setFilm,
    draggedId: id ?? null,
    target: dragging?.target ?? null,
    start,
  };
}

/** The rows on screen but the dragged item itself. */
function rowsOf(film: HTMLElement | null, draggedId: string): DropRow[] {
  const rows = film?.querySelectorAll<HTMLElement>('[data-drop-id]') ?? [];
  return [...rows].flatMap((row): DropRow[] => {
    const { dropId, dropKind } = row.dataset;
    if (dropId === undefined || dropId === draggedId || row.closest(`[data-item-id="${draggedId}"]`))
      return [];
    const { top, bottom } = row.getBoundingClientRect();
    const kind = dropKind === 'head' || dropKind === 'foot' ? dropKind : 'layer';
    return [{ id: dropId, kind, top, bottom }];
  });
}
