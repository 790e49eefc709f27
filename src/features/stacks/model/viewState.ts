import { axisSchema } from '../../../../shared/run.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import { workingPointSchema } from '../../../../shared/stack.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { readReadingView, writeReadingView } from '../../../components/plot/readingView.ts';
import type { Family, ReadingView } from '../../../components/plot/readingView.ts';

import type { Materials } from './media.ts';
import { defaultAxis, fitsFilm, withFewerPoints } from './sweepAxis.ts';

/** What the address restores. Null stands for the choice that follows from the stack. */
export type ViewState = ReadingView & {
  point: WorkingPoint;
  kind: AxisKind;
  axis: SweepAxis | null;
  /** Whether two axes are swept; `second` is then the other one, null for its default. */
  isMap: boolean;
  second: SweepAxis | null;
  /** A parameter that the curve or map is repeated for. */
  family: SweepAxis | null;
};

/**
 * Reads the address. A part that is missing or makes no sense falls back to the stack's own working point or to
 * the default, never to an error: addresses are edited by hand and outlive layers.
 */
export function readView(search: URLSearchParams, saved: WorkingPoint): ViewState {
  const kind = axisKinds.find((one) => one === search.get('axis')) ?? 'angle';
  return {
    point: readPoint(search, saved),
    kind,
    ...readReadingView(search),
    axis: readAxis(search, '', kind),
    isMap: search.get('map') === '1',
    second: readAxis(search, 'second-'),
    family: readAxis(search, 'family-'),
  };
}

const axisKinds = [
  'wavelength',
  'angle',
  'thickness',
  'direction',
  'voigtScale',
  'repeat',
  'graded',
] as const;

/** An axis of the address; its keys begin with the prefix. */
function readAxis(
  search: URLSearchParams,
  prefix: string,
  kind = search.get(`${prefix}axis`),
): SweepAxis | null {
  const text = (key: string) => search.get(prefix + key) ?? undefined;
  const layer = text('layer');
  const axis = axisSchema.safeParse({
    kind,
    ...(layer === undefined ? {} : { layerId: layer }),
    ...(kind === 'repeat' ? { blockId: text('block') } : {}),
    ...(kind === 'direction' ? { plane: text('plane') } : {}),
    from: numberIn(search, `${prefix}from`),
    to: numberIn(search, `${prefix}to`),
    points: numberIn(search, `${prefix}points`),
    spacing: text('spacing') ?? 'linear',
  });
  return axis.success ? axis.data : null;
}

function writeAxis(search: URLSearchParams, prefix: string, axis: SweepAxis): void {
  if ('layerId' in axis && axis.layerId !== undefined) search.set(`${prefix}layer`, axis.layerId);
  if (axis.kind === 'repeat') search.set(`${prefix}block`, axis.blockId);
  if (axis.kind === 'direction') search.set(`${prefix}plane`, axis.plane);
  search.set(`${prefix}from`, String(axis.from));
  search.set(`${prefix}to`, String(axis.to));
  search.set(`${prefix}points`, String(axis.points));
  if (axis.spacing === 'log') search.set(`${prefix}spacing`, 'log');
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
  if (axis !== null) writeAxis(search, '', axis);
  if (view.isMap) search.set('map', '1');
  for (const [prefix, other] of [
    ['second-', view.isMap ? view.second : null],
    ['family-', view.family],
  ] as const) {
    if (other === null) continue;
    search.set(`${prefix}axis`, other.kind);
    writeAxis(search, prefix, other);
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
  if (axis !== null && fitsFilm(axis, document)) return axis;
  return defaultAxis(kind, document, materials);
}

/** The second axis of a map: that of the address where it fits, else wavelength or angle, whichever is free. */
export function secondAxisOf(
  view: Pick<ViewState, 'isMap' | 'second'>,
  first: SweepAxis | null,
  document: StackDocument,
  materials: Materials,
): SweepAxis | null {
  if (!view.isMap || first === null) return null;
  if (view.second && fitsFilm(view.second, document)) return view.second;
  const other = defaultAxis(first.kind === 'wavelength' ? 'angle' : 'wavelength', document, materials);
  return other && withFewerPoints(other, 'map');
}

/** What is drawn until somebody chooses. For purely transverse m there is no rotation to draw. */
export function usualFamilies(transverse: boolean): readonly Family[] {
  return transverse ? transverseFamilies : kerrFamilies;
}

const kerrFamilies: readonly Family[] = ['rotation', 'ellipticity', 'reflectance'];
const transverseFamilies: readonly Family[] = ['contrast', 'reflectance'];
