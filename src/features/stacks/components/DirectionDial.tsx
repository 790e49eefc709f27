import { useRef } from 'react';
import type { KeyboardEvent, PointerEvent } from 'react';
import type { Vector } from '../../../../shared/complex.ts';
import { describeM, drawnAngleDeg, lengthOf, turnedTo } from '../model/magnetization.ts';

type Props = {
  m: Vector;
  /** Whose m it is, such as "Co, layer 2". */
  label: string;
  /** Without it the arrow is only drawn. */
  onChange?: ((m: Vector) => void) | undefined;
  size?: number;
};

/** Degrees of one arrow key, and of one with Shift. */
const STEP = 15;
const FINE_STEP = 1;
/** A dragged arrow stops at these unless Alt is held. */
const SNAP = 15;

/**
 * The arrow of m as the drawing shows it (x to the right, z down). It is dragged about its middle, from however far
 * outside, or turned with the arrow keys. What lies across the drawing shows as a dot (+y, toward the reader) or a
 * cross (−y).
 */
export function DirectionDial({ m, label, onChange, size = 26 }: Props) {
  const element = useRef<HTMLSpanElement>(null);
  const arrow = <Arrow m={m} size={size} />;
  if (!onChange) {
    return (
      <span role="img" aria-label={`m of ${label}: ${describeM(m)}`} className="inline-flex">
        {arrow}
      </span>
    );
  }
  const turn = (angleDeg: number) => onChange(turnedTo(m, angleDeg));
  const onPointerMove = (event: PointerEvent) => {
    if (!element.current?.hasPointerCapture?.(event.pointerId)) return;
    const box = element.current.getBoundingClientRect();
    const [x, z] = [event.clientX - (box.left + box.right) / 2, event.clientY - (box.top + box.bottom) / 2];
    if (Math.hypot(x, z) < 3) return;
    const angle = (Math.atan2(z, x) * 180) / Math.PI;
    turn(event.altKey ? Number(angle.toFixed(1)) : Math.round(angle / SNAP) * SNAP);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.altKey) return;
    const step = event.shiftKey ? FINE_STEP : STEP;
    const angle = drawnAngleDeg(m);
    if (event.key === 'ArrowRight' || event.key === 'ArrowDown') turn(angle + step);
    else if (event.key === 'ArrowLeft' || event.key === 'ArrowUp') turn(angle - step);
    else if (event.key === 'Home') turn(90);
    else if (event.key === 'End') turn(-90);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <span
      ref={element}
      role="slider"
      tabIndex={0}
      aria-label={`direction of m in ${label}`}
      aria-valuemin={-180}
      aria-valuemax={180}
      aria-valuenow={Math.round(drawnAngleDeg(m))}
      aria-valuetext={describeM(m)}
      title="Drag to turn; arrow keys turn by 15°, with Shift by 1°"
      className="inline-flex cursor-grab touch-none rounded-full hover:bg-magnet/15 active:cursor-grabbing"
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
      }}
      onPointerMove={onPointerMove}
      onKeyDown={onKeyDown}
    >
      {arrow}
    </span>
  );
}

function Arrow({ m, size }: { m: Vector; size: number }) {
  const length = lengthOf(m);
  const inPlane = Math.hypot(m[0], m[2]);
  const reach = 9.5 * inPlane;
  const across = Math.abs(m[1]) > 0.02;
  return (
    <svg width={size} height={size} viewBox="-13 -13 26 26" aria-hidden="true" focusable="false">
      {inPlane > 0.02 && (
        <g transform={`rotate(${drawnAngleDeg(m)})`} stroke="var(--magnet)" fill="var(--magnet)">
          <line x1={-reach} x2={reach - 3} y1="0" y2="0" strokeWidth="2.6" />
          <path d={`M${reach + 1.5} 0l-8 -4.6v9.2z`} stroke="none" />
        </g>
      )}
      {across && (
        // Where m has both parts, the mark sits at the arrow's tail and leaves the arrow to be seen.
        <g
          stroke="var(--magnet)"
          strokeWidth="1.6"
          transform={
            inPlane > 0.02
              ? `rotate(${drawnAngleDeg(m)}) translate(${-reach} 0) rotate(${-drawnAngleDeg(m)})`
              : undefined
          }
        >
          <circle r={inPlane > 0.02 ? 3.6 : 7.5} fill="var(--paper)" />
          {m[1] > 0 ? (
            <circle r={inPlane > 0.02 ? 1.3 : 2.2} fill="var(--magnet)" stroke="none" />
          ) : (
            <path d={inPlane > 0.02 ? 'M-2 -2l4 4M-2 2l4 -4' : 'M-5 -5l10 10M-5 5l10 -10'} />
          )}
        </g>
      )}
      {length <= 0.02 && (
        <circle r="4" fill="none" stroke="var(--magnet)" strokeWidth="1.8" strokeDasharray="2 2" />
      )}
    </svg>
  );
}
