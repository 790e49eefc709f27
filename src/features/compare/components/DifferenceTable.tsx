import { readingDefinitions } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import { formatCount, formatNumber, fromDegrees } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { curveOf } from '../model/comparedRun.ts';
import type { ComparedRun } from '../model/comparedRun.ts';
import { relate, sizeOf } from '../model/curveDifference.ts';

type Props = {
  runs: readonly ComparedRun[];
  reference: ComparedRun;
  reading: ReadingName;
  unit: AngleUnit;
  xAxis: PlotAxis;
};

/** How far each run lies from the reference: largest difference and root mean square. */
export function DifferenceTable({ runs, reference, reading, unit, xAxis }: Props) {
  const angle = readingDefinitions[reading].unit === 'deg';
  const show = (value: number | null) =>
    value === null
      ? 'none'
      : `${formatNumber(angle ? fromDegrees(value, unit) : value)}${angle ? ` ${unit}` : ''}`;
  const base = curveOf(reference, reading);
  return (
    <section aria-label="Differences in numbers" className="overflow-x-auto">
      <table className="w-full text-left">
        <caption className="mb-1 text-left text-note text-muted">
          {readingDefinitions[reading].label}: difference to {reference.letter} at the{' '}
          {formatCount(base.x.length)} points of {reference.letter}, within the range that both have; others
          are interpolated linearly between their own points.
        </caption>
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
          {runs
            .filter((one) => one !== reference)
            .map((one) => {
              const differences = relate(reading, 'difference', base, curveOf(one, reading));
              const { count, largest, at, rms } = sizeOf(base.x, differences);
              return (
                <tr key={one.run.id} className="border-b border-line last:border-b-0">
                  <th scope="row" className="py-1 pr-4 font-semibold whitespace-nowrap">
                    {one.letter} − {reference.letter}
                  </th>
                  <td className="py-1 pr-4 whitespace-nowrap">{show(largest)}</td>
                  <td className="py-1 pr-4 whitespace-nowrap text-muted">
                    {at === null ? 'no common point' : (xAxis.format ?? String)(at)}
                  </td>
                  <td className="py-1 pr-4 whitespace-nowrap">{show(rms)}</td>
                  <td className="py-1 pr-4">{formatCount(count)}</td>
                </tr>
              );
            })}
        </tbody>
      </table>
    </section>
  );
}
