import { Arrow } from '../../../components/Arrow.tsx';

/** The axes of a tensor, x to the right, y toward the reader and z down, with the magnetization along or against z. */
export function AxesDrawing({ along }: { along: '+z' | '-z' }) {
  const [from, to] = along === '+z' ? [30, 92] : [92, 30];
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[230px]" fontSize="11">
      <Arrow from={[48, 18]} to={[104, 18]} color="var(--muted)" head={8} />
      <Arrow from={[48, 18]} to={[48, 98]} color="var(--muted)" head={8} />
      <circle cx="48" cy="18" r="6" fill="var(--panel)" stroke="var(--muted)" />
      <circle cx="48" cy="18" r="1.8" fill="var(--muted)" />
      <text x="108" y="22" fill="var(--muted)">
        x
      </text>
      <text x="30" y="14" fill="var(--muted)">
        y
      </text>
      <text x="32" y="98" fill="var(--muted)">
        z
      </text>
      <Arrow from={[78, from]} to={[78, to]} color="var(--magnet)" width={3} />
      <text x="90" y="66" fill="var(--ink)" fontSize="13">
        +m
      </text>
    </svg>
  );
}
