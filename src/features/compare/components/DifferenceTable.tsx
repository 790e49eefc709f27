import { useId } from 'react';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import { formatCount, formatNumber, fromDegrees } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import type { DifferenceRow } from '../model/differenceRows.ts';

type Props = {
  rows: readonly DifferenceRow[];
  /** The letter of the reference, and how many points it has. */
  letter: string;
  points: number;
  reading: ReadingName;
  unit: AngleUnit;
  axes: readonly PlotAxis[];
  /** Curves that are held against none. */
  unpaired: readonly string[];
};

/** How far each curve or map lies from the reference: largest difference and root mean square. */
export function DifferenceTable({ rows, letter, points, reading, unit, axes, unpaired }: Props) {
  const captionId = useId();
  const angle = readingDefinitions[reading].unit === 'deg';
  const show = (value: number | null) =>
    value === null
      ? 'none'
      : `${formatNumber(angle ? fromDegrees(value, unit) : value)}${angle ? ` ${unit}` : ''}`;
  const place = (at: readonly number[]) =>
    at.map((value, index) => (axes[index]?.format ?? String)(value)).join(', ');
  return (
    <section aria-label="Differences in numbers">
      <p id={captionId} className="mb-1 text-note text-muted">
        {readingDefinitions[reading].label}: difference to {letter} at the {formatCount(points)} points of{' '}
        {letter}, within the range that both have; others are interpolated{' '}
        {axes.length > 1 ? 'bilinearly' : 'linearly'} between their own points.
      </p>
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Table of differences">
        <table className="w-full text-left" aria-labelledby={captionId}>
          <thead className="text-small text-muted">
            <tr className="border-b border-line">
              {['Run', 'Largest', 'at', 'Root mean square', 'Points with both'].map((header) => (
                <th key={header} scope="col" className="py-1 pr-4 font-medium">
                  {header}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ name, count, largest, at, rms }) => (
              <tr key={name} className="border-b border-line last:border-b-0">
                <th scope="row" className="py-1 pr-4 font-semibold whitespace-nowrap">
                  {name}
                </th>
                <td className="py-1 pr-4 whitespace-nowrap">{show(largest)}</td>
                <td className="py-1 pr-4 whitespace-nowrap text-muted">
                  {at === null ? 'no common point' : place(at)}
                </td>
                <td className="py-1 pr-4 whitespace-nowrap">{show(rms)}</td>
                <td className="py-1 pr-4">{formatCount(count)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {unpaired.length > 0 && (
        <p className="mt-2 text-note">
          {letter} has no curve at the value of {unpaired.join(', ')}: no difference is formed. Choose one
          value above and the nearest is taken.
        </p>
      )}
    </section>
  );
}
