import type { IndexDispersion } from '../../../../shared/dispersion.ts';
import { formatNumber, formatPlain } from '../../../lib/format.ts';

/** What is stored: the tabulated points, or the formula with its coefficients. */
export function DispersionDetail({ index }: { index: IndexDispersion }) {
  if (index.kind === 'formula') {
    return (
      <div className="flex flex-col gap-2">
        <p>
          n = <code className="wrap-anywhere">{index.expression}</code> with L the vacuum wavelength in µm, k
          = 0, valid from {formatPlain(index.rangeNm[0])} to {formatPlain(index.rangeNm[1])} nm.
        </p>
        {index.coefficients.length > 0 ? (
          <p className="text-note text-muted">
            {index.coefficients
              .map((value, position) => `c${position + 1} = ${formatPlain(value)}`)
              .join(', ')}
          </p>
        ) : null}
      </div>
    );
  }
  const { wavelengthsNm, n, k } = index;
  return (
    <details>
      <summary className="text-accent">
        {wavelengthsNm.length === 1
          ? 'The one tabulated point'
          : `All ${wavelengthsNm.length} tabulated points`}
      </summary>
      <div tabIndex={0} role="region" aria-label="Tabulated points" className="mt-2 max-h-80 overflow-auto">
        <table className="w-full max-w-md text-right text-note">
          <thead className="sticky top-0 bg-panel text-muted">
            <tr>
              <th className="py-1 pr-6 font-medium">wavelength (nm)</th>
              <th className="py-1 pr-6 font-medium">n</th>
              <th className="py-1 font-medium">k</th>
            </tr>
          </thead>
          <tbody>
            {wavelengthsNm.map((wavelength, position) => (
              <tr key={wavelength} className="border-t border-line">
                <td className="py-0.5 pr-6">{formatPlain(wavelength)}</td>
                <td className="py-0.5 pr-6">{formatNumber(n[position] ?? NaN)}</td>
                <td className="py-0.5">{formatNumber(k[position] ?? NaN)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
