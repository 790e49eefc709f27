import type { DesignPoint, PointReadings } from '../../../../shared/designPoint.ts';
import { printQuantity, readingQuantities } from '../model/quantities.ts';
import { pointReadingNames } from '../model/readingNames.ts';

type Props = {
  points: readonly DesignPoint[];
  /** Empty where there are none. */
  found: readonly { pointId: string; readings: PointReadings }[];
  /** Which film it is, such as "best film". */
  of: string;
  /** Why there are none, where there are none. */
  whyNone: string;
};

/** Every reading of one film at each working point. */
export function PointReadingsTable({ points, found, of, whyNone }: Props) {
  const heading = `Readings: ${of}`;
  if (found.length === 0) {
    return (
      <section aria-label={heading} className="min-w-0">
        <h2 className="mb-2 text-lead">{heading}</h2>
        <p className="text-muted">{whyNone}</p>
      </section>
    );
  }
  return (
    <section aria-label={heading} className="min-w-0">
      <h2 className="mb-2 text-lead">{heading}</h2>
      <div className="card overflow-x-auto">
        <table className="w-full">
          <thead>
            <tr className="border-b border-line text-note text-muted">
              <td />
              {found.map(({ pointId }) => (
                <th key={pointId} scope="col" className="px-3 py-1.5 text-right font-medium">
                  {points.find(({ id }) => id === pointId)?.label ?? pointId}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {pointReadingNames.map((name) => (
              <tr key={name} className="border-b border-line last:border-b-0">
                <th scope="row" className="px-3 py-1.5 text-left font-medium first-letter:uppercase">
                  {readingQuantities[name].label}
                </th>
                {found.map(({ pointId, readings }) => (
                  <td key={pointId} className="px-3 py-1.5 text-right whitespace-nowrap">
                    {printQuantity(readingQuantities[name], readings[name])}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
