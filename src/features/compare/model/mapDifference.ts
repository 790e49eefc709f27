import type { ReadingName } from '../../../../shared/run.ts';
import type { MapData } from '../../../components/plot/map/mapTypes.ts';
import { isRotation, relateValues } from './curveDifference.ts';
import type { Relation } from './curveDifference.ts';
import type { ComparedRun, ComparedSlice } from './comparedRun.ts';
import { between, shareOf } from './interpolate.ts';
import { mapIn } from './runSlice.ts';

/**
 * A map's values on the grid of another, which has the same quantities on x and y: bilinear between the four values
 * around, NaN outside of the map and beside a gap.
 */
export function resampleMap(map: MapData, { x, y }: Pick<MapData, 'x' | 'y'>, turns: boolean): Float64Array {
  const columns = Array.from(x, (value) => shareOf(map.x, value));
  const values = new Float64Array(x.length * y.length).fill(NaN);
  for (let iy = 0; iy < y.length; iy++) {
    const row = shareOf(map.y, y[iy]!);
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
      const values = resampleMap(mapIn(other.of.result, other, reading), data, isRotation(reading));
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
