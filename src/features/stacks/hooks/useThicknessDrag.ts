import { useRef, useState } from 'react';
import type { PointerEvent } from 'react';
import { draggedThickness } from '../model/thicknessDrag.ts';

/** Steps closer together are one, or a pointer that reports 120 times a second leaves no time to draw what follows. */
const STEP_MS = 30;

/** The step that comes once the time for it has come. */
type Pace = { steppedAt: number; timer: number; waiting: (() => void) | null };

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
  const pace = useRef<Pace>({ steppedAt: 0, timer: 0, waiting: null });
  const changeTo = (nm: number, { number }: Grab) => {
    if (nm !== thicknessNm) onChange(nm, `drag ${number}`);
  };
  const stepTo = (nm: number, held: Grab, now: number) => {
    forgetStep();
    const wait = Math.max(0, pace.current.steppedAt + STEP_MS - now);
    const step = () => {
      pace.current = { steppedAt: now + wait, timer: 0, waiting: null };
      onChange(nm, `drag ${held.number}`);
    };
    if (wait > 0) {
      pace.current.waiting = step;
      pace.current.timer = window.setTimeout(step, wait);
    } else if (nm !== thicknessNm) step();
  };
  const forgetStep = () => {
    window.clearTimeout(pace.current.timer);
    pace.current.waiting = null;
  };
  const letGo = () => {
    forgetStep();
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
        stepTo(draggedThickness(grab.startNm, event.clientY - grab.y, leastNm), grab, event.timeStamp);
      },
      onPointerUp: () => {
        pace.current.waiting?.();
        letGo();
      },
      onPointerCancel: putBack,
    },
    putBack,
  };
}
