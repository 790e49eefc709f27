import { readingDefinitions } from '../../../shared/readings.ts';
import type { ReadingName } from '../../../shared/run.ts';
import { farthestApart } from '../../features/materials/model/compareCurves.ts';
import { formatAngle, formatNumber } from '../../lib/format.ts';

type Effect = {
  reading: ReadingName;
  grid: readonly number[];
  /** With A and with B; angles in degrees. */
  values: readonly [ArrayLike<number>, ArrayLike<number>];
  names: readonly [string, string];
  workingNm: number;
};

/** The largest difference that the exchange makes, and that at the working point, in words. */
export function effectInWords({ reading, grid, values, names, workingNm }: Effect): string {
  const [a, b] = [Array.from(values[0]), Array.from(values[1])];
  const farthest = farthestApart({ a, b });
  if (farthest === null) return 'No reading exists at any of these wavelengths.';
  const at = (index: number) => ({ a: a[index] ?? NaN, b: b[index] ?? NaN });
  const angle = readingDefinitions[reading].unit === 'deg';
  const text = (value: number) =>
    angle ? `${formatAngle(value)} mdeg` : formatNumber(value, { signed: true });
  // Across a change of sign, or from nothing, a share in percent says nothing.
  const share = (pair: { a: number; b: number }) =>
    pair.a * pair.b > 0
      ? ` (${formatNumber((100 * (pair.b - pair.a)) / Math.abs(pair.a), { digits: 2, signed: true })} %)`
      : '';
  const most = at(farthest);
  const difference = most.b - most.a;
  if (difference === 0) return 'The exchange changes nothing.';
  const largest = `Largest difference at ${wavelength(grid[farthest])}: ${text(most.a)} with ${names[0]}, ${text(most.b)} with ${names[1]}, that is ${text(difference)}${share(most)}.`;
  const working = grid.indexOf(workingNm);
  if (working < 0 || working === farthest) return largest;
  const there = at(working);
  return `${largest} At the working point, ${wavelength(workingNm)}: ${text(there.a)} and ${text(there.b)}${share(there)}.`;
}

function wavelength(nm = NaN): string {
  return `${Number(nm.toPrecision(4))} nm`;
}
