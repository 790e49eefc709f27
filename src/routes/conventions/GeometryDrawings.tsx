import { useId } from 'react';
import { Arrow, TowardReader } from '../../components/Arrow.tsx';

const geometries = [
  { name: 'polar', m: '(0, 0, ±1)', hint: 'along the normal, + into the film' },
  { name: 'longitudinal', m: '(±1, 0, 0)', hint: 'in the film and the plane of incidence' },
  { name: 'transverse', m: '(0, ±1, 0)', hint: 'in the film, across the plane of incidence' },
] as const;

/** The three named directions of m, each in the plane of incidence of the large drawing. */
export function GeometryDrawings() {
  return (
    <ul className="grid gap-4 sm:grid-cols-3">
      {geometries.map((geometry) => (
        <li key={geometry.name} className="card p-3">
          <GeometryDrawing name={geometry.name} />
          <p className="mt-1 font-semibold">
            {geometry.name}{' '}
            <span className="font-normal">
              <var>m</var> = {geometry.m}
            </span>
          </p>
          <p className="text-note text-muted">{geometry.hint}</p>
        </li>
      ))}
    </ul>
  );
}

function GeometryDrawing({ name }: { name: (typeof geometries)[number]['name'] }) {
  const hatch = useId();
  const color = 'var(--magnet)';
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[220px]">
      <defs>
        <pattern id={hatch} width="7" height="7" patternTransform="rotate(45)" patternUnits="userSpaceOnUse">
          <line x1="0" y1="0" x2="0" y2="7" stroke={color} strokeWidth="1.3" opacity="0.42" />
        </pattern>
      </defs>
      <rect y="48" width="200" height="48" fill="var(--magnet-soft)" />
      <rect y="48" width="200" height="48" fill={`url(#${hatch})`} />
      <Arrow from={[42, 8]} to={[97, 46]} color="var(--accent)" head={7} width={1.6} />
      <Arrow from={[103, 46]} to={[158, 8]} color="var(--accent)" head={7} width={1.6} />
      <rect x="62" y="53" width="76" height="38" rx="6" fill="var(--panel)" opacity="0.9" />
      {name === 'polar' ? <Arrow from={[100, 57]} to={[100, 88]} color={color} width={3} /> : null}
      {name === 'longitudinal' ? <Arrow from={[74, 72]} to={[128, 72]} color={color} width={3} /> : null}
      {name === 'transverse' ? <TowardReader at={[100, 72]} color={color} /> : null}
    </svg>
  );
}
