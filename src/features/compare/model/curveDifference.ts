import type { ReadingName } from '../../../../shared/run.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import { foldDegrees } from '../../../../shared/units.ts';
import { between, placeOn } from './interpolate.ts';

/** A reading along the axis of a run: degrees or plain numbers, NaN where there is none. */
export type ComparedCurve = {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  /** Along an axis that counts: there is nothing between two points. */
  discrete?: boolean;
};

export const relations = ['difference', 'ratio'] as const;
export type Relation = (typeof relations)[number];

/**
 * The curve's values at other places: linear between its own points (none there along an axis that counts), NaN outside
 * of it and beside a gap.
 */
export function resample(curve: ComparedCurve, grid: ArrayLike<number>, turns: boolean): Float64Array {
  return Float64Array.from(grid, (x) => {
    const place = placeOn(curve.x, x, curve.discrete ?? false);
    return place === null ? NaN : between(curve.y[place.low]!, curve.y[place.high]!, place.share, turns);
  });
}

/** A curve against a reference, on the reference's axis within what both have. */
export function relate(
  reading: ReadingName,
  relation: Relation,
  reference: ComparedCurve,
  other: ComparedCurve,
): Float64Array {
  return relateValues(reading, relation, reference.y, resample(other, reference.x, isRotation(reading)));
}

/**
 * Values against those of a reference at the same points: the other minus the reference, or over it. A ratio to 0 is
 * none. Rotations are told apart by at most 90 deg: an ellipse turned by 180 deg is the same.
 */
export function relateValues(
  reading: ReadingName,
  relation: Relation,
  reference: ArrayLike<number>,
  values: ArrayLike<number>,
): Float64Array {
  const turns = isRotation(reading);
  return Float64Array.from(values, (value, index) => {
    const base = reference[index] ?? NaN;
    if (relation === 'ratio') return base === 0 ? NaN : value / base;
    return turns && Number.isFinite(value - base) ? foldDegrees(value - base) : value - base;
  });
}

export function isRotation(reading: ReadingName): boolean {
  return readingDefinitions[reading].unit === 'deg' && reading.toLowerCase().includes('rotation');
}

export type DifferenceSize = {
  /** Of the points of the reference at which both have a value. */
  count: number;
  /** Largest absolute difference, and at which point; null where no point has both values. */
  largest: number | null;
  at: number | null;
  /** Root of the mean square over those points. */
  rms: number | null;
};

/** How large differences are; points are indices into them. */
export function sizeOf(differences: ArrayLike<number>): DifferenceSize {
  const size: DifferenceSize = { count: 0, largest: null, at: null, rms: null };
  let squares = 0;
  for (let index = 0; index < differences.length; index++) {
    const difference = Math.abs(differences[index]!);
    if (Number.isNaN(difference)) continue;
    size.count++;
    squares += difference * difference;
    if (size.largest === null || difference > size.largest) {
      size.largest = difference;
      size.at = index;
    }
  }
  if (size.count > 0) size.rms = Math.sqrt(squares / size.count);
  return size;
}
