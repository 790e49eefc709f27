import type { ReadingName } from '../../../../shared/run.ts';
import type { MapData } from '../../../components/plot/map/mapTypes.ts';
import { isRotation, relateValues } from './curveDifference.ts';
import type { Relation } from './curveDifference.ts';
import type { ComparedRun, ComparedSlice } from './comparedRun.ts';
import { isDiscrete } from './heldQuantities.ts';
import { between, placeOn } from './interpolate.ts';
import type { RunAxis } from './runAxes.ts';
import { mapIn } from './runSlice.ts';

/**
 * A map's values on the grid of another, which has the same quantities on x and y: bilinear between the four values
 * around, NaN outside of the map, beside a gap and, along an axis that counts, between its points.
 *
 * @param axes those of the map, the one across first
 */
function resampleMap(
  map: MapData,
  axes: readonly RunAxis[],
  { x, y }: Pick<MapData, 'x' | 'y'>,
  turns: boolean,
): Float64Array {
  const [counted = false, countedUp = false] = axes.map(isDiscrete);
  const columns = Array.from(x, (value) => placeOn(map.x, value, counted));
  const values = new Float64Array(x.length * y.length).fill(NaN);
  for (let iy = 0; iy < y.length; iy++) {
    const row = placeOn(map.y, y[iy]!, countedUp);
    if (row === null) continue;
    const [low, high] = [row.low * map.x.length, row.high * map.x.length];
    for (let ix = 0; ix < x.length; ix++) {
      const column = columns[ix];
      if (!column) continue;
      const lower = between(
        map.values[low + column.low]!,
        map.values[low + column.high]!,
        column.share,
        turns,
      );
      const upper = between(
        map.values[high + column.low]!,
        map.values[high + column.high]!,
        column.share,
        turns,
      );
      values[iy * x.length + ix] = between(lower, upper, row.share, turns);
    }
  }
  return values;
}

/** The map of a run on the grid of the reference's, in degrees or plain numbers. */
export type ComparedMap = { slice: ComparedSlice; data: MapData };

/** The reference's map and those of the others on its grid; null where the reference has none. */
export function comparedMaps(
  runs: readonly ComparedRun[],
  reference: ComparedRun,
  reading: ReadingName,
): { base: ComparedMap; others: ComparedMap[] } | null {
  const [slice] = reference.slices;
  if (!slice) return null;
  const data = mapIn(reference.result, slice, reading);
  const others = runs
    .filter((one) => one !== reference)
    .flatMap((one) => one.slices)
    .map((other): ComparedMap => {
      const own = mapIn(other.of.result, other, reading);
      const values = resampleMap(own, other.axes, data, isRotation(reading));
      return { slice: other, data: { ...data, values } };
    });
  return { base: { slice, data }, others };
}

/** A map against the reference's, on the same grid. */
export function relateMaps(
  base: ComparedMap,
  other: ComparedMap,
  reading: ReadingName,
  relation: Relation,
): MapData {
  return { ...base.data, values: relateValues(reading, relation, base.data.values, other.data.values) };
}
