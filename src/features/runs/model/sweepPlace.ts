import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { findLayerPath } from '../../../../shared/stackCase.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { formatPlain } from '../../../lib/format.ts';

/** Where the working point of the film stands on the swept axis; null where the axis does not reach it. */
export function workingPlace(axis: SweepAxis, document: StackDocument): number | null {
  const place = placeOf(axis, document);
  const inside =
    place !== null && place >= Math.min(axis.from, axis.to) && place <= Math.max(axis.from, axis.to);
  return inside ? place : null;
}

function placeOf(axis: SweepAxis, document: StackDocument): number | null {
  switch (axis.kind) {
    case 'wavelength':
      return document.workingPoint.wavelengthNm;
    case 'angle':
      return document.workingPoint.angleDeg;
    case 'thickness':
      return sweptLayer(axis, document)?.thicknessNm ?? null;
    default:
      return null;
  }
}

/** The layer whose thickness is swept. */
export function sweptLayer(axis: SweepAxis, document: StackDocument) {
  if (axis.kind !== 'thickness') return null;
  let items = document.layers;
  const path = findLayerPath(items, axis.layerId) ?? [];
  for (const position of path) {
    const item = items[position];
    if (item === undefined) return null;
    if (!('layers' in item)) return item;
    items = item.layers;
  }
  return null;
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

export type PlaceValues = { x: number; values: Partial<Record<ReadingName, number>> };

/** The stored values at the grid point nearest to x; a reading that does not exist there is NaN. */
export function valuesNear(result: RunResult, x: number): PlaceValues {
  const index = nearestIndex(result.axis, x);
  const values: Partial<Record<ReadingName, number>> = {};
  for (const { name } of result.header.readings) values[name] = result.columns[name]?.[index] ?? NaN;
  return { x: result.axis[index] ?? NaN, values };
}
