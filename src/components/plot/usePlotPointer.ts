import { useEffect, useState } from 'react';
import type { PointerEvent } from 'react';
import type { PlotLayout } from './plotLayout.ts';
import { fromPixel, toPixel, zoomWindow } from './plotScale.ts';
import type { Window } from './plotScale.ts';

type Drag = { kind: 'select' | 'marker'; startX: number; x: number };

/** Pixels within which a press takes hold of the working point, and below which a drag is a click. */
const HOLD = 8;
const CLICK = 4;

type Target = {
  layout: PlotLayout;
  full: Window;
  marker: number | undefined;
  onWindow: (window: Window) => void;
  onCursor: (x: number | null) => void;
  onPick: ((x: number) => void) | undefined;
};

/**
 * What a pointer does on the figure: moving reads values, a drag selects a part to zoom to, a click (or a drag of
 * its line) sets the working point, the wheel zooms while the figure has the focus or Ctrl is held.
 * A finger reads values and sets the working point; it never zooms by accident.
 */
export function usePlotPointer(element: HTMLElement | null, target: Target) {
  const { layout, full, marker, onWindow, onCursor, onPick } = target;
  const [drag, setDrag] = useState<Drag | null>(null);

  const place = (event: { clientX: number }, within: Element) => {
    const x = event.clientX - within.getBoundingClientRect().left;
    return Math.min(Math.max(x, layout.frame.left), layout.frame.right);
  };

  useEffect(() => {
    if (element === null) return;
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !element.contains(document.activeElement)) return;
      event.preventDefault();
      const center = fromPixel(layout.x, event.clientX - element.getBoundingClientRect().left);
      const factor = Math.exp(Math.max(-0.5, Math.min(0.5, event.deltaY / 300)));
      onWindow(zoomWindow([layout.x.min, layout.x.max], full, center, factor, layout.x.log));
    };
    // React listens to the wheel passively, which cannot keep the page from scrolling.
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [element, layout, full, onWindow]);

  return {
    selection: drag?.kind === 'select' && Math.abs(drag.x - drag.startX) >= CLICK ? drag : null,
    draggingMarker: drag?.kind === 'marker',
    handlers: {
      onPointerDown(event: PointerEvent<HTMLElement>) {
        if (event.button !== 0) return;
        const x = place(event, event.currentTarget);
        const atMarker = onPick && marker !== undefined && Math.abs(toPixel(layout.x, marker) - x) <= HOLD;
        if (event.pointerType === 'touch' && !atMarker) {
          onCursor(fromPixel(layout.x, x));
          return;
        }
        event.currentTarget.setPointerCapture?.(event.pointerId);
        setDrag({ kind: atMarker ? 'marker' : 'select', startX: x, x });
      },
      onPointerMove(event: PointerEvent<HTMLElement>) {
        const x = place(event, event.currentTarget);
        onCursor(fromPixel(layout.x, x));
        if (drag === null) return;
        setDrag({ ...drag, x });
        if (drag.kind === 'marker') onPick?.(fromPixel(layout.x, x));
      },
      onPointerUp(event: PointerEvent<HTMLElement>) {
        if (drag === null) return;
        setDrag(null);
        const x = place(event, event.currentTarget);
        const moved = Math.abs(x - drag.startX) >= CLICK;
        if (drag.kind === 'marker' || !moved) onPick?.(fromPixel(layout.x, x));
        else {
          const ends = [fromPixel(layout.x, drag.startX), fromPixel(layout.x, x)];
          onWindow([Math.min(...ends), Math.max(...ends)]);
        }
      },
      onPointerCancel: () => setDrag(null),
      onPointerLeave(event: PointerEvent<HTMLElement>) {
        // A finger that lifts leaves too; the values it asked for stay.
        if (drag === null && event.pointerType !== 'touch') onCursor(null);
      },
    },
  };
}
