import { axisSchema } from '../../../../shared/run.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import { workingPointSchema } from '../../../../shared/stack.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { readReadingView, writeReadingView } from '../../../components/plot/readingView.ts';
import type { Family, ReadingView } from '../../../components/plot/readingView.ts';

import { findItem, isBlock } from './items.ts';
import type { Materials } from './media.ts';
import { defaultAxis } from './sweepAxis.ts';

/** What the address restores. Null stands for the choice that follows from the stack. */
export type ViewState = ReadingView & {
  point: WorkingPoint;
  kind: AxisKind;
  axis: SweepAxis | null;
};

/**
 * Reads the address. A part that is missing or makes no sense falls back to the stack's own working point or to
 * the default, never to an error: addresses are edited by hand and outlive layers.
 */
export function readView(search: URLSearchParams, saved: WorkingPoint): ViewState {
  const kind = search.get('axis');
  const view: Omit<ViewState, 'axis'> = {
    point: readPoint(search, saved),
    kind: kind === 'wavelength' || kind === 'thickness' ? kind : ('angle' as const),
    ...readReadingView(search),
  };
  const axis = axisSchema.safeParse({
    kind: view.kind,
    ...(view.kind === 'thickness' ? { layerId: search.get('layer') ?? '' } : {}),
    from: numberIn(search, 'from'),
    to: numberIn(search, 'to'),
    points: numberIn(search, 'points'),
    spacing: search.get('spacing') ?? 'linear',
  });
  return { ...view, axis: axis.success ? axis.data : null };
}

function readPoint(search: URLSearchParams, saved: WorkingPoint): WorkingPoint {
  const m = search.get('m');
  const parts = m?.split(',').map(Number);
  const asked = {
    wavelengthNm: numberIn(search, 'wl'),
    angleDeg: numberIn(search, 'angle'),
    input: search.get('input'),
    inputAzimuthDeg: numberIn(search, 'azimuth'),
    magnetization:
      m === 'drawn' || m === 'reversed'
        ? { mode: m }
        : parts?.length === 3
          ? { mode: 'direction', m: parts }
          : null,
  };
  const { shape } = workingPointSchema;
  const inputAzimuthDeg =
    shape.inputAzimuthDeg.safeParse(asked.inputAzimuthDeg).data ?? saved.inputAzimuthDeg;
  return {
    ...(inputAzimuthDeg === undefined ? {} : { inputAzimuthDeg }),
    wavelengthNm: shape.wavelengthNm.safeParse(asked.wavelengthNm).data ?? saved.wavelengthNm,
    angleDeg: shape.angleDeg.safeParse(asked.angleDeg).data ?? saved.angleDeg,
    input: shape.input.safeParse(asked.input).data ?? saved.input,
    magnetization: shape.magnetization.safeParse(asked.magnetization).data ?? saved.magnetization,
  };
}

function numberIn(search: URLSearchParams, key: string): number | undefined {
  const text = search.get(key);
  return text === null || text.trim() === '' ? undefined : Number(text);
}

/** The address of a view: what equals the stack's own working point or the default is left out. */
export function writeView(view: ViewState, saved: WorkingPoint): URLSearchParams {
  const search = new URLSearchParams();
  const { point, axis } = view;
  if (point.wavelengthNm !== saved.wavelengthNm) search.set('wl', String(point.wavelengthNm));
  if (point.angleDeg !== saved.angleDeg) search.set('angle', String(point.angleDeg));
  if (point.input !== saved.input) search.set('input', point.input);
  if (point.inputAzimuthDeg !== undefined && point.inputAzimuthDeg !== saved.inputAzimuthDeg) {
    search.set('azimuth', String(point.inputAzimuthDeg));
  }
  if (!sameMagnetization(point, saved)) {
    const { magnetization } = point;
    search.set('m', magnetization.mode === 'direction' ? magnetization.m.join(',') : magnetization.mode);
  }
  if (view.kind !== 'angle') search.set('axis', view.kind);
  if (axis !== null) {
    if (axis.kind === 'thickness') search.set('layer', axis.layerId);
    search.set('from', String(axis.from));
    search.set('to', String(axis.to));
    search.set('points', String(axis.points));
    if (axis.spacing === 'log') search.set('spacing', 'log');
  }
  writeReadingView(view, search);
  return search;
}

export function samePoint(a: WorkingPoint, b: WorkingPoint): boolean {
  return (
    a.wavelengthNm === b.wavelengthNm &&
    a.angleDeg === b.angleDeg &&
    a.input === b.input &&
    a.inputAzimuthDeg === b.inputAzimuthDeg &&
    sameMagnetization(a, b)
  );
}

function sameMagnetization(a: WorkingPoint, b: WorkingPoint): boolean {
  return JSON.stringify(a.magnetization) === JSON.stringify(b.magnetization);
}

/** The axis of the address where it still fits the film, else the default of its kind; null without a layer. */
export function axisOf(
  view: Pick<ViewState, 'axis' | 'kind'>,
  document: StackDocument,
  materials: Materials,
): SweepAxis | null {
  const { axis, kind } = view;
  if (axis === null) return defaultAxis(kind, document, materials);
  if (axis.kind !== 'thickness') return axis;
  const layer = findItem(document.layers, axis.layerId);
  return layer && !isBlock(layer) ? axis : defaultAxis(kind, document, materials);
}

/** What is drawn until somebody chooses. For purely transverse m there is no rotation to draw. */
export function usualFamilies(transverse: boolean): readonly Family[] {
  return transverse ? transverseFamilies : kerrFamilies;
}

const kerrFamilies: readonly Family[] = ['rotation', 'ellipticity', 'reflectance'];
const transverseFamilies: readonly Family[] = ['contrast', 'reflectance'];
