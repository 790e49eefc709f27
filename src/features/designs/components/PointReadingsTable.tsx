import type { DesignPoint, PointReadings } from '../../../../shared/designPoint.ts';
import { printQuantity, readingQuantities } from '../model/quantities.ts';
import { pointReadingNames } from '../model/readingNames.ts';

type Props = {
  points: readonly DesignPoint[];
  found: readonly { pointId: string; readings: PointReadings }[];
};

/** Every reading of the best film at each working point. */
export function PointReadingsTable({ points, found }: Props) {
  return (
    <section aria-label="Readings of the best film" className="min-w-0">
      <h2 className="mb-2 text-lead">Readings of the best film</h2>
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
