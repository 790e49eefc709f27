import { axisUnitOf } from '../../../../shared/resultFormat.ts';
import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import { fromDegrees } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { curveOf } from './comparedCurves.ts';
import { relate, sizeOf } from './curveDifference.ts';
import type { DifferenceSize } from './curveDifference.ts';
import { relateMaps } from './mapDifference.ts';
import type { ComparedMap } from './mapDifference.ts';
import { pairName } from './slicePairs.ts';
import type { SlicePair } from './slicePairs.ts';

/** How far one curve or map lies from the reference's; `at` is the place of the largest difference on each axis. */
export type DifferenceRow = Omit<DifferenceSize, 'at'> & { name: string; at: readonly number[] | null };

export function curveRows(pairs: readonly SlicePair[], reading: ReadingName): DifferenceRow[] {
  return pairs.map((pair) => {
    const base = curveOf(pair.base, reading);
    const { at, ...size } = sizeOf(relate(reading, 'difference', base, curveOf(pair.other, reading)));
    return { ...size, name: pairName(pair, 'difference'), at: at === null ? null : [base.x[at] ?? NaN] };
  });
}

export function mapRows(
  base: ComparedMap,
  others: readonly ComparedMap[],
  reading: ReadingName,
): DifferenceRow[] {
  return others.map((other) => {
    const { x, y, values } = relateMaps(base, other, reading, 'difference');
    const { at, ...size } = sizeOf(values);
    const place = at === null ? null : [x[at % x.length] ?? NaN, y[Math.floor(at / x.length)] ?? NaN];
    return { ...size, name: pairName({ base: base.slice, other: other.slice }, 'difference'), at: place };
  });
}

/** The rows as lines of `# ` in front of a file, in the unit of the screen. */
export function differenceLines(
  rows: readonly DifferenceRow[],
  axes: readonly SweepAxis[],
  reading: ReadingName,
  unit: AngleUnit,
): string {
  const angle = readingDefinitions[reading].unit === 'deg';
  const print = (value: number) => (angle ? `${fromDegrees(value, unit)} ${unit}` : String(value));
  const lines = rows.map(({ name, count, largest, at, rms }) => {
    const plain = name.replace('−', '-');
    if (largest === null || at === null || rms === null) return `${plain}: no point with both values`;
    const place = axes.map((axis, index) => `${axisHeader(axis)} ${at[index]}`).join(', ');
    return `${plain}: largest difference ${print(largest)} at ${place}; root mean square ${print(rms)}; points with both values: ${count}`;
  });
  return lines.map((line) => `# ${line}\n`).join('');
}

/** An axis as the head of a column: `angle (deg)`. */
export function axisHeader(axis: SweepAxis): string {
  const unit = axisUnitOf(axis);
  return unit === '1' ? axis.kind : `${axis.kind} (${unit})`;
}
