import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { AxisField } from '../../../../shared/runAxes.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { MapData } from '../../../components/plot/map/mapTypes.ts';
import { isRotation } from './curveDifference.ts';
import type { ComparedCurve } from './curveDifference.ts';
import { between } from './interpolate.ts';
import type { GridShare } from './interpolate.ts';

/**
 * What is taken from a result: along one of its axes or two (the first across), every other held at a place. At most
 * one place lies between two values of its axis.
 */
export type RunSlice = {
  along: readonly AxisField[];
  held: readonly { field: AxisField; place: GridShare }[];
};

/** The values of an axis of a result. */
export function gridOf(result: RunResult, field: AxisField): Float64Array {
  return result[field] ?? new Float64Array();
}

export function curveIn(
  result: RunResult,
  { along: [field = 'axis'], held }: RunSlice,
  reading: ReadingName,
): ComparedCurve {
  const x = gridOf(result, field);
  return { x, y: valuesIn(result, [field], held, reading) };
}

export function mapIn(
  result: RunResult,
  { along: [across = 'axis', up = 'second'], held }: RunSlice,
  reading: ReadingName,
): MapData {
  const [x, y] = [gridOf(result, across), gridOf(result, up)];
  return { x, y, values: valuesIn(result, [across, up], held, reading) };
}

/** Values along the named axes, the first innermost; NaN for a reading that was not stored. */
function valuesIn(
  result: RunResult,
  along: readonly AxisField[],
  held: RunSlice['held'],
  reading: ReadingName,
): Float64Array {
  const strides = stridesOf(result);
  const [inner, outer] = along.map((field) => ({
    count: gridOf(result, field).length,
    stride: strides[field],
  }));
  const { count: columns, stride: across } = inner ?? { count: 0, stride: 1 };
  const { count: rows, stride: up } = outer ?? { count: 1, stride: 0 };
  const stored = result.columns[reading];
  if (!stored) return new Float64Array(columns * rows).fill(NaN);
  const start = held.reduce((sum, { field, place }) => sum + strides[field] * place.low, 0);
  const split = held.find(({ place }) => place.share > 0);
  const step = split ? strides[split.field] * (split.place.high - split.place.low) : 0;
  const share = split?.place.share ?? 0;
  // As it is stored: a million values are not copied to be shown.
  if (share === 0 && across === 1 && (rows === 1 || up === columns)) {
    return stored.subarray(start, start + columns * rows);
  }
  const turns = isRotation(reading);
  const values = new Float64Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const at = start + row * up + column * across;
      values[row * columns + column] = between(stored[at]!, stored[at + step]!, share, turns);
    }
  }
  return values;
}

/** How far the values of neighbours on each axis lie apart (resultFormat.ts: first axis innermost, family outermost). */
function stridesOf({ axis, second }: RunResult): Record<AxisField, number> {
  return { axis: 1, second: axis.length, family: axis.length * (second?.length ?? 1) };
}
