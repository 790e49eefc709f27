import type { SignHabits } from '../../../../shared/materialImport.ts';
import { Arrow } from '../../../components/Arrow.tsx';
import { ArcArrow } from './ArcArrow.tsx';

const center = [48, 52] as const;
const radius = 32;

/** A wave that enters an absorber from the left at x = 104 and fades; drawn once, it is the same in both habits. */
const wave = Array.from({ length: 91 }, (_, step) => {
  const depth = Math.max(0, step - 22);
  const height = 22 * Math.exp(-depth / 24) * Math.cos(step * 0.36);
  return `${step === 0 ? 'M' : 'L'} ${(102 + step).toFixed(1)} ${(46 - height).toFixed(1)}`;
}).join(' ');

/** How the field turns in the complex plane, and what N an absorbing medium then has. */
export function PhasorDrawing({ time }: { time: SignHabits['time'] }) {
  const minus = time === 'exp(-iwt)';
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[230px]" fontSize="11">
      <line x1="8" x2="94" y1={center[1]} y2={center[1]} stroke="var(--line)" />
      <line x1={center[0]} x2={center[0]} y1="10" y2="94" stroke="var(--line)" />
      <circle cx={center[0]} cy={center[1]} r={radius} fill="none" stroke="var(--edge)" />
      <text x="84" y="66" fill="var(--muted)">
        Re
      </text>
      <text x="51" y="12" fill="var(--muted)">
        Im
      </text>
      <Arrow from={center} to={[center[0] + radius * 0.866, center[1] - radius * 0.5]} color="var(--ink)" />
      <ArcArrow
        center={center}
        radius={radius}
        fromDeg={38}
        toDeg={minus ? -92 : 168}
        color="var(--accent)"
        width={2.6}
      />
      <rect x="124" y="14" width="76" height="62" fill="var(--noble)" />
      <line x1="124" x2="124" y1="10" y2="80" stroke="var(--edge)" />
      <path d={wave} fill="none" stroke="var(--ink)" strokeWidth="1.5" />
      <text x="162" y="97" fill="var(--ink)" fontSize="13" textAnchor="middle">
        N = n {minus ? '+' : '−'} ik
      </text>
    </svg>
  );
}
