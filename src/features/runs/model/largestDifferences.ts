import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { ReadingName } from '../../../../shared/run.ts';

export type Difference = {
  reading: ReadingName;
  /** Largest absolute difference, in the unit of the reading. */
  largest: number;
  /** Where it is. */
  x: number;
  /** Points at which only one of the two has a value. */
  oneSided: number;
};

/**
 * What changed between two results of the same input: the largest difference of each reading that both have, and
 * where. Null when their grids differ, so that point cannot be compared with point.
 */
export function largestDifferences(older: RunResult, newer: RunResult): Difference[] | null {
  const count = older.axis.length;
  if (count !== newer.axis.length || older.axis.some((x, index) => x !== newer.axis[index])) return null;
  return older.header.readings.flatMap(({ name }) => {
    const [a, b] = [older.columns[name], newer.columns[name]];
    if (!a || !b) return [];
    const found: Difference = { reading: name, largest: 0, x: older.axis[0]!, oneSided: 0 };
    for (let index = 0; index < count; index++) {
      const difference = Math.abs(b[index]! - a[index]!);
      if (Number.isNaN(a[index]!) !== Number.isNaN(b[index]!)) found.oneSided++;
      if (difference > found.largest) {
        found.largest = difference;
        found.x = older.axis[index]!;
      }
    }
    return [found];
  });
}
