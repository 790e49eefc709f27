import { useId } from 'react';
import type { SignHabits } from '../../../../shared/materialImport.ts';
import { Arrow } from '../../../components/Arrow.tsx';

/** A magnetic film from the side, light from above, and the direction of its positive magnetization. */
export function MagnetizationDrawing({ points }: { points: SignHabits['magnetization'] }) {
  const hatch = useId();
  const color = 'var(--magnet)';
  const [from, to] = points === 'into the film' ? [52, 94] : [94, 52];
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[230px]" fontSize="11">
      <defs>
        <pattern id={hatch} width="7" height="7" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
          <line x1="0" y1="0" x2="0" y2="7" stroke={color} strokeWidth="1.3" opacity="0.42" />
        </pattern>
      </defs>
      <rect x="20" y="46" width="160" height="54" fill="var(--magnet-soft)" />
      <rect x="20" y="46" width="160" height="54" fill={`url(#${hatch})`} />
      <Arrow from={[58, 6]} to={[58, 44]} color="var(--accent)" head={8} />
      <text x="66" y="22" fill="var(--muted)">
        light
      </text>
      <rect x="84" y="49" width="56" height="48" rx="6" fill="var(--panel)" />
      <Arrow from={[102, from]} to={[102, to]} color={color} width={3} />
      <text x="114" y="78" fill="var(--ink)" fontSize="13">
        +m
      </text>
    </svg>
  );
}
