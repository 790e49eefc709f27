import { useEffect, useState } from 'react';
import type { PointerEvent } from 'react';
import { fromPixel, zoomWindow } from '../plotScale.ts';
import type { MapLayout, MapWindow } from './mapLayout.ts';

type Point = { px: number; py: number };
type Values = { x: number; y: number };

/** Below this a drag is a click, px. */
const CLICK = 5;

type Target = {
  layout: MapLayout;
  full: MapWindow;
  onWindow: (window: MapWindow) => void;
  onCursor: (values: Values | null) => void;
  onPick: (values: Values) => void;
};

/**
 * What a pointer does on a map: moving reads values, a drag selects a part to zoom to, a click sets the cut, the wheel
 * zooms while the map has the focus or Ctrl is held. A finger reads and sets the cut; it never zooms by accident.
 */
export function useMapPointer(element: HTMLElement | null, target: Target) {
  const { layout, full, onWindow, onCursor, onPick } = target;
  const [drag, setDrag] = useState<{ start: Point; now: Point } | null>(null);
  const { frame } = layout;

  const place = (event: { clientX: number; clientY: number }, within: Element): Point => {
    const { left, top } = within.getBoundingClientRect();
    return {
      px: Math.min(Math.max(event.clientX - left, frame.left), frame.right),
      py: Math.min(Math.max(event.clientY - top, frame.top), frame.bottom),
    };
  };
  const valuesAt = ({ px, py }: Point): Values => ({
    x: fromPixel(layout.x, px),
    y: fromPixel(layout.y, py),
  });

  useEffect(() => {
    if (element === null) return;
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey && !element.contains(document.activeElement)) return;
      event.preventDefault();
      const { left, top } = element.getBoundingClientRect();
      const factor = Math.exp(Math.max(-0.5, Math.min(0.5, event.deltaY / 300)));
      const zoomed = (axis: 'x' | 'y', pixel: number) => {
        const scale = layout[axis];
        return zoomWindow([scale.min, scale.max], full[axis], fromPixel(scale, pixel), factor, scale.log);
      };
      onWindow({ x: zoomed('x', event.clientX - left), y: zoomed('y', event.clientY - top) });
    };
    // React listens to the wheel passively, which cannot keep the page from scrolling.
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [element, layout, full, onWindow]);

  const wide = drag && Math.hypot(drag.now.px - drag.start.px, drag.now.py - drag.start.py) >= CLICK;
  return {
    selection: wide ? drag : null,
    handlers: {
      onPointerDown(event: PointerEvent<HTMLElement>) {
        if (event.button !== 0) return;
        const start = place(event, event.currentTarget);
        if (event.pointerType === 'touch') {
          onCursor(valuesAt(start));
          onPick(valuesAt(start));
          return;
        }
        event.currentTarget.setPointerCapture?.(event.pointerId);
        setDrag({ start, now: start });
      },
      onPointerMove(event: PointerEvent<HTMLElement>) {
        const now = place(event, event.currentTarget);
        onCursor(valuesAt(now));
        if (drag) setDrag({ ...drag, now });
      },
      onPointerUp(event: PointerEvent<HTMLElement>) {
        if (drag === null) return;
        setDrag(null);
        const [a, b] = [valuesAt(drag.start), valuesAt(place(event, event.currentTarget))];
        if (!wide) onPick(b);
        else if (a.x !== b.x && a.y !== b.y) {
          onWindow({
            x: [Math.min(a.x, b.x), Math.max(a.x, b.x)],
            y: [Math.min(a.y, b.y), Math.max(a.y, b.y)],
          });
        }
      },
      onPointerCancel: () => setDrag(null),
      onPointerLeave(event: PointerEvent<HTMLElement>) {
        if (drag === null && event.pointerType !== 'touch') onCursor(null);
      },
    },
  };
}
