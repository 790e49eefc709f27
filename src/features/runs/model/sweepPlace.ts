import type { ReadingName, SweepAxes, SweepAxis } from '../../../../shared/run.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { formatPlain } from '../../../lib/format.ts';
import { placeOnAxis } from '../../../lib/placeOnAxis.ts';

/** Where the working point of the film stands on the swept axis; null where the axis does not reach it. */
export function workingPlace(axis: SweepAxis, document: StackDocument): number | null {
  const place = placeOnAxis(axis, document);
  const inside =
    place !== null && place >= Math.min(axis.from, axis.to) && place <= Math.max(axis.from, axis.to);
  return inside ? place : null;
}

/** The working point moved along the sweep, for the drawing that goes with a value that is being read. */
export function pointAt(axis: SweepAxis, point: WorkingPoint, x: number): WorkingPoint {
  switch (axis.kind) {
    case 'wavelength':
      return { ...point, wavelengthNm: x };
    case 'angle':
      return { ...point, angleDeg: x };
    default:
      return point;
  }
}

/** `angle 30°`, `wavelength 632.8 nm`, `thickness of Pt 3 nm`. */
export function describePlace(axis: SweepAxis, x: number, layerName: string | null): string {
  const value = formatPlain(Number(x.toPrecision(7)));
  switch (axis.kind) {
    case 'wavelength':
      return `wavelength ${value} nm`;
    case 'angle':
      return `angle ${value}°`;
    case 'thickness':
      return `thickness of ${layerName ?? 'the layer'} ${value} nm`;
    case 'direction':
      return `m at ${value}°`;
    case 'voigtScale':
      return `Q scaled by ${value}`;
    case 'repeat':
      return `${value} repeats`;
    case 'graded':
      return `interface width ${value} nm`;
  }
}

export type PlaceValues = { values: Partial<Record<ReadingName, number>> };

/** A point of the grid: along the first axis, the second, and the member of the family. */
export type GridPlace = { ix: number; iy: number; member: number };

/** What a swept layer is called; undefined where an axis is of nothing in particular. */
export type NameOfTarget = (axis: SweepAxis) => string | undefined;

/** The point of an index into the values (resultFormat.ts: first axis innermost, family outermost). */
export function placeAt({ axis, second }: RunResult, index: number): GridPlace {
  const [nx, ny] = [axis.length, second?.length ?? 1];
  return { ix: index % nx, iy: Math.floor(index / nx) % ny, member: Math.floor(index / (nx * ny)) };
}

/** The grid point nearest to where the film itself stands; the first of an axis that does not reach it. */
export function homePlace(axes: SweepAxes, result: RunResult, document: StackDocument): GridPlace {
  const nearest = (axis: SweepAxis | undefined, grid: Float64Array | null) =>
    axis && grid ? Math.max(0, nearestIndex(grid, workingPlace(axis, document) ?? axis.from)) : 0;
  return {
    ix: nearest(axes.axis, result.axis),
    iy: nearest(axes.second, result.second),
    member: nearest(axes.family, result.family),
  };
}

/** `angle 30°, wavelength 632.8 nm`: a point of the grid in words. */
export function describeGridPlace(
  axes: SweepAxes,
  result: RunResult,
  { ix, iy, member }: GridPlace,
  nameOf: NameOfTarget,
): string {
  const say = (axis: SweepAxis | undefined, x: number | undefined) =>
    axis && x !== undefined ? [describePlace(axis, x, nameOf(axis) ?? null)] : [];
  return [
    ...say(axes.axis, result.axis[ix]),
    ...say(axes.second, result.second?.[iy]),
    ...say(axes.family, result.family?.[member]),
  ].join(', ');
}

/** The stored values at a point of the grid; a reading that does not exist there is NaN. */
export function valuesAt(result: RunResult, { ix, iy, member }: GridPlace): PlaceValues['values'] {
  const index = (member * (result.second?.length ?? 1) + iy) * result.axis.length + ix;
  const values: PlaceValues['values'] = {};
  for (const { name } of result.header.readings) values[name] = result.columns[name]?.[index] ?? NaN;
  return values;
}
