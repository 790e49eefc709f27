import type { SignHabits } from '../../../../shared/materialImport.ts';

const columns = [70, 112, 148] as const;
const rows = [28, 56, 84] as const;

/** The permittivity tensor for m along +z with the sign that the source gives to its element xy. */
export function TensorDrawing({ sign }: { sign: SignHabits['voigtSign'] }) {
  const plus = sign === '+iQ';
  const cells = [
    ['1', plus ? '+iQ' : '−iQ', '0'],
    [plus ? '−iQ' : '+iQ', '1', '0'],
    ['0', '0', '1'],
  ];
  return (
    <svg viewBox="0 0 200 104" aria-hidden="true" className="w-full max-w-[230px]" fontSize="13">
      <text x="14" y="60" fill="var(--ink)">
        ε = ε
        <tspan fontSize="9" dy="3">
          d
        </tspan>
      </text>
      <path d="M 58 12 H 52 V 94 H 58 M 162 12 H 168 V 94 H 162" fill="none" stroke="var(--ink)" />
      <rect x="92" y="12" width="40" height="24" rx="5" fill="var(--accent-soft)" stroke="var(--accent)" />
      {cells.flatMap((cellsOfRow, row) =>
        cellsOfRow.map((text, column) => (
          <text
            key={`${row} ${column}`}
            x={columns[column]}
            y={(rows[row] ?? 0) + 1}
            textAnchor="middle"
            fill={text.endsWith('iQ') ? 'var(--ink)' : 'var(--muted)'}
            fontWeight={row === 0 && column === 1 ? 700 : 400}
          >
            {text}
          </text>
        )),
      )}
      <text x="172" y="30" fill="var(--muted)" fontSize="11">
        xy
      </text>
    </svg>
  );
}
