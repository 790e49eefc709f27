import { formatCount, formatPlain } from '../../../lib/format.ts';

/** Rows on screen at most; a long table is for the export. */
const MOST_ROWS = 500;

type PointTableProps = {
  wavelengthsNm: readonly number[];
  /** Two values a row, named by `heads`. */
  values: readonly (readonly [number, number])[];
  heads: readonly [string, string];
};

/** Tabulated points as they are stored, folded away until somebody wants to read them. */
export function PointTable({ wavelengthsNm, values, heads }: PointTableProps) {
  const count = wavelengthsNm.length;
  const shown = wavelengthsNm.slice(0, MOST_ROWS);
  const head = 'py-1 pr-6 font-medium';
  return (
    <details>
      <summary className="text-accent">
        {count === 1 ? 'The one tabulated point' : `All ${formatCount(count)} tabulated points`}
      </summary>
      <div
        tabIndex={0}
        role="region"
        aria-label={`Tabulated points of ${heads.join(' and ')}`}
        className="mt-2 max-h-80 overflow-auto"
      >
        <table className="w-full max-w-md text-right text-note">
          <thead className="sticky top-0 bg-panel text-muted">
            <tr>
              <th className={head}>wavelength (nm)</th>
              <th className={head}>{heads[0]}</th>
              <th className={head}>{heads[1]}</th>
            </tr>
          </thead>
          <tbody>
            {shown.map((wavelength, position) => (
              <tr key={position} className="border-t border-line">
                <td className="py-0.5 pr-6">{formatPlain(wavelength)}</td>
                <td className="py-0.5 pr-6">{formatPlain(values[position]?.[0] ?? NaN)}</td>
                <td className="py-0.5 pr-6">{formatPlain(values[position]?.[1] ?? NaN)}</td>
              </tr>
            ))}
          </tbody>
        </table>
        {count > MOST_ROWS ? (
          <p className="mt-1 text-note text-muted">
            The first {MOST_ROWS} of {formatCount(count)} rows. Export CSV gives all of them.
          </p>
        ) : null}
      </div>
    </details>
  );
}
