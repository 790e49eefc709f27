import { useEffect, useRef, useState } from 'react';

/** Two changes this close belong to one movement, and a movement ends this long after its last change. */
const QUIET_MS = 500;

/**
 * Whether the value is being moved, as by dragging or by a held arrow key: from its second quick change on, until it has
 * stood still for half a second and no button of the pointer is down.
 */
export function useMoving(value: unknown): boolean {
  const [seen, setSeen] = useState(value);
  const [stage, setStage] = useState<'still' | 'touched' | 'moving'>('still');
  const pressed = useRef(false);
  if (value !== seen) {
    setSeen(value);
    setStage(stage === 'still' ? 'touched' : 'moving');
  }
  useEffect(() => {
    const onPointer = (event: PointerEvent) => (pressed.current = event.buttons > 0);
    const names = ['pointerdown', 'pointerup', 'pointercancel'] as const;
    for (const name of names) window.addEventListener(name, onPointer, true);
    return () => names.forEach((name) => window.removeEventListener(name, onPointer, true));
  }, []);
  useEffect(() => {
    const timer = setInterval(() => {
      if (!pressed.current) setStage('still');
    }, QUIET_MS);
    return () => clearInterval(timer);
  }, [seen]);
  return stage === 'moving';
}
