import type { ReactNode } from 'react';
import type { SignHabits } from '../../../../shared/materialImport.ts';
import { ArcArrow } from './ArcArrow.tsx';

type Turn = SignHabits['rotation'];

const center = [136, 52] as const;
const tiltDeg = 24;

/** The frame of both drawings: an eye that looks into the beam at the left, what it sees at the right. */
function BeamView({ children }: { children: ReactNode }) {
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[230px]" fontSize="11">
      <path d="M 10 52 Q 26 34 42 52 Q 26 70 10 52 Z" fill="none" stroke="var(--muted)" strokeWidth="1.6" />
      <circle cx="26" cy="52" r="5.5" fill="var(--muted)" />
      <line x1="48" x2="76" y1="52" y2="52" stroke="var(--muted)" strokeDasharray="3 3" />
      <circle cx={center[0]} cy={center[1]} r="46" fill="var(--panel)" stroke="var(--line)" />
      {children}
    </svg>
  );
}

function Stroke({ angleDeg, color, dash }: { angleDeg: number; color: string; dash?: string }) {
  const angle = (angleDeg * Math.PI) / 180;
  const [dx, dy] = [40 * Math.cos(angle), -40 * Math.sin(angle)];
  return (
    <line
      x1={center[0] - dx}
      y1={center[1] - dy}
      x2={center[0] + dx}
      y2={center[1] + dy}
      stroke={color}
      strokeWidth={dash ? 1.4 : 2.2}
      strokeDasharray={dash}
    />
  );
}

/** The plane of polarization before (dashed) and after a positive rotation. */
export function RotationDrawing({ turns }: { turns: Turn }) {
  const sense = turns === 'counter-clockwise' ? 1 : -1;
  return (
    <BeamView>
      <Stroke angleDeg={90} color="var(--muted)" dash="4 3" />
      <Stroke angleDeg={90 + sense * tiltDeg} color="var(--rotation)" />
      <ArcArrow
        center={center}
        radius={34}
        fromDeg={90}
        toDeg={90 + sense * (tiltDeg + 2)}
        color="var(--rotation)"
      />
      <text x={center[0] + (sense > 0 ? -40 : 24)} y="22" fill="var(--rotation)" fontWeight="600">
        +φ
      </text>
    </BeamView>
  );
}

/** The path of the tip of the field of light with positive ellipticity. */
export function EllipticityDrawing({ turns }: { turns: Turn }) {
  const sense = turns === 'counter-clockwise' ? 1 : -1;
  return (
    <BeamView>
      <ArcArrow
        center={center}
        radius={38}
        flatten={0.55}
        fromDeg={90 + sense * 20}
        toDeg={90 + sense * 350}
        color="var(--ellipticity)"
        width={2.4}
      />
      <text x={center[0] - 8} y={center[1] + 4} fill="var(--ellipticity)" fontWeight="600">
        +χ
      </text>
    </BeamView>
  );
}
