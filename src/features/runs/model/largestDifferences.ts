import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { ReadingName } from '../../../../shared/run.ts';

const none = new Float64Array(0);

export type Difference = {
  reading: ReadingName;
  /** Largest absolute difference, in the unit of the reading. */
  largest: number;
  /** Where it is, as an index into the values (resultFormat.ts). */
  index: number;
  /** Points at which only one of the two has a value. */
  oneSided: number;
};

/**
 * What changed between two results of the same input: the largest difference of each reading that both have, and
 * where. Null when their grids differ, so that point cannot be compared with point.
 */
export function largestDifferences(older: RunResult, newer: RunResult): Difference[] | null {
  const differ = (['axis', 'second', 'family'] as const).some((field) => {
    const [a, b] = [older[field] ?? none, newer[field] ?? none];
    return a.length !== b.length || a.some((x, index) => x !== b[index]);
  });
  if (differ) return null;
  const count = older.header.pointCount;
  return older.header.readings.flatMap(({ name }) => {
    const [a, b] = [older.columns[name], newer.columns[name]];
    if (!a || !b) return [];
    const found: Difference = { reading: name, largest: 0, index: 0, oneSided: 0 };
    for (let index = 0; index < count; index++) {
      const difference = Math.abs(b[index]! - a[index]!);
      if (Number.isNaN(a[index]!) !== Number.isNaN(b[index]!)) found.oneSided++;
      if (difference > found.largest) {
        found.largest = difference;
        found.index = index;
      }
    }
    return [found];
  });
}
