import { useRef, useState } from 'react';
import type { PointerEvent } from 'react';
import { draggedThickness } from '../model/thicknessDrag.ts';

/** Steps closer together are one, or a pointer that reports 120 times a second leaves no time to draw what follows. */
const STEP_MS = 30;

type Grab = { pointerId: number; y: number; startNm: number; number: number };

/**
 * Dragging the lower face of a layer up and down. Escape, or a drag that the system takes away, puts the layer back.
 *
 * @param onChange the thickness and a name for the drag, all of which is one step of undo
 */
export function useThicknessDrag(
  thicknessNm: number,
  leastNm: number,
  onChange: (thicknessNm: number, drag: string) => void,
) {
  const [grab, setGrab] = useState<Grab | null>(null);
  const drags = useRef(0);
  const pace = useRef({ steppedAt: 0, timer: 0 });
  const changeTo = (nm: number, { number }: Grab) => {
    if (nm !== thicknessNm) onChange(nm, `drag ${number}`);
  };
  const stepTo = (nm: number, held: Grab) => {
    window.clearTimeout(pace.current.timer);
    const wait = pace.current.steppedAt + STEP_MS - performance.now();
    const step = () => {
      pace.current.steppedAt = performance.now();
      onChange(nm, `drag ${held.number}`);
    };
    if (wait > 0) pace.current.timer = window.setTimeout(step, wait);
    else if (nm !== thicknessNm) step();
  };
  const letGo = () => {
    window.clearTimeout(pace.current.timer);
    setGrab(null);
  };
  const putBack = () => {
    if (grab) changeTo(grab.startNm, grab);
    letGo();
  };
  return {
    dragging: grab !== null,
    handlers: {
      onPointerDown: (event: PointerEvent<HTMLElement>) => {
        if (event.button !== 0) return;
        event.preventDefault();
        event.currentTarget.setPointerCapture(event.pointerId);
        drags.current += 1;
        setGrab({
          pointerId: event.pointerId,
          y: event.clientY,
          startNm: thicknessNm,
          number: drags.current,
        });
      },
      onPointerMove: (event: PointerEvent<HTMLElement>) => {
        if (grab?.pointerId !== event.pointerId) return;
        stepTo(draggedThickness(grab.startNm, event.clientY - grab.y, leastNm), grab);
      },
      onPointerUp: (event: PointerEvent<HTMLElement>) => {
        if (grab?.pointerId === event.pointerId) {
          changeTo(draggedThickness(grab.startNm, event.clientY - grab.y, leastNm), grab);
        }
        letGo();
      },
      onPointerCancel: putBack,
    },
    putBack,
  };
}
