import { axisValues } from '../../../../shared/axisValues.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { SUBSTRATE, axisSchema } from '../../../../shared/run.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { spreadNodeCount } from '../../../../shared/stackCase.ts';
import { findItem, isBlock, listBlocks, listLayers } from './items.ts';
import { materialOf } from './media.ts';
import type { Materials } from './media.ts';

/** Points of the live preview at most; the run that is kept has as many as are asked for. */
export const PREVIEW_POINTS = 200;
/** Points along either axis of a previewed map at most, and curves of a previewed family of maps. */
const MAP_PREVIEW_POINTS = 40;
/** Points that a new axis of a map, and of a family, begins with. */
const MAP_POINTS = 100;
const FAMILY_POINTS = 6;

/** The values of an axis at `points` points instead of its own. */
export function axisGrid(axis: SweepAxis, points: number): number[] {
  const values = axisValues({ ...axis, points: Math.max(1, points) });
  // Repeats are whole numbers; fewer points than there are numbers leave some out.
  return axis.kind === 'repeat' ? [...new Set(values.map(Math.round))] : values;
}

/** An axis that makes sense for this film: within the constants' range, around the layer's thickness. */
export function defaultAxis(
  kind: AxisKind,
  document: StackDocument,
  materials: Materials,
  layerId?: string,
): SweepAxis | null {
  const grid = { points: PREVIEW_POINTS, spacing: 'linear' } as const;
  switch (kind) {
    case 'wavelength': {
      const [from, to] = commonRange(document, materials);
      return { kind, from, to, ...grid };
    }
    case 'angle':
      return { kind, from: 0, to: 89, ...grid };
    case 'thickness': {
      const layer = (layerId && findItem(document.layers, layerId)) || listLayers(document.layers)[0];
      if (!layer || isBlock(layer)) return null;
      return { kind, layerId: layer.id, from: 0, to: roundUp(Math.max(2.5 * layer.thicknessNm, 1)), ...grid };
    }
    case 'direction':
      return isAnyMagnetic(document) ? { kind, plane: 'xz', from: 0, to: 360, ...grid } : null;
    case 'voigtScale':
      return isAnyMagnetic(document) ? { kind, from: 0, to: 2, ...grid } : null;
    case 'repeat': {
      const block = listBlocks(document.layers)[0];
      if (!block) return null;
      const to = Math.max(10, Math.min(LIMITS.repeat, 2 * block.repeat));
      return { kind, blockId: block.id, from: 1, to, points: to, spacing: 'linear' };
    }
    case 'graded': {
      const layers = listLayers(document.layers);
      const layer =
        layerId === SUBSTRATE ? undefined : (layers.find(({ id }) => id === layerId) ?? layers[1]);
      const above = layers[(layer ? layers.indexOf(layer) : layers.length) - 1];
      if (!above) return null;
      const room = Math.min(above.thicknessNm, layer?.thicknessNm ?? Infinity);
      return { kind, layerId: layer?.id ?? SUBSTRATE, from: 0, to: room > 0 ? room : 1, ...grid };
    }
  }
}

/** The same axis for a map or a family, with as many points as suit it. */
export function withFewerPoints(axis: SweepAxis, role: 'map' | 'family'): SweepAxis {
  const whole = axis.kind === 'repeat' ? Math.abs(axis.to - axis.from) + 1 : Infinity;
  if (role === 'map') return { ...axis, points: Math.min(MAP_POINTS, whole) };
  if (axis.kind !== 'repeat') return { ...axis, points: FAMILY_POINTS };
  return {
    ...axis,
    to: axis.from + 5 * Math.max(1, Math.floor((axis.to - axis.from) / 5)),
    points: FAMILY_POINTS,
  };
}

/** What can be swept in this film, besides wavelength and angle. */
export function sweepableKinds(document: StackDocument): AxisKind[] {
  const layers = listLayers(document.layers);
  const magnetic: AxisKind[] = isAnyMagnetic(document) ? ['direction', 'voigtScale'] : [];
  return [
    'wavelength',
    'angle',
    ...(layers.length > 0 ? (['thickness'] as const) : []),
    ...magnetic,
    ...(listBlocks(document.layers).length > 0 ? (['repeat'] as const) : []),
    ...(layers.length > 0 ? (['graded'] as const) : []),
  ];
}

function isAnyMagnetic(document: StackDocument): boolean {
  return document.substrateM !== undefined || listLayers(document.layers).some(({ m }) => m !== undefined);
}

/** Whether what an axis names is still in the film. */
export function fitsFilm(axis: SweepAxis, document: StackDocument): boolean {
  switch (axis.kind) {
    case 'wavelength':
    case 'angle':
      return true;
    case 'thickness':
      return isLayer(document, axis.layerId);
    case 'repeat':
      return listBlocks(document.layers).some(({ id }) => id === axis.blockId);
    case 'graded':
      return axis.layerId === SUBSTRATE || isLayer(document, axis.layerId);
    case 'direction':
    case 'voigtScale':
      if (axis.layerId === undefined) return isAnyMagnetic(document);
      return axis.layerId === SUBSTRATE ? document.substrateM !== undefined : isLayer(document, axis.layerId);
  }
}

function isLayer(document: StackDocument, id: string): boolean {
  const item = findItem(document.layers, id);
  return item !== null && !isBlock(item);
}

/** The part of 400 to 800 nm for which every index is known; all of it where they have nothing in common. */
function commonRange(document: StackDocument, materials: Materials): [number, number] {
  const media = [
    document.incident,
    ...listLayers(document.layers).map((layer) => layer.medium),
    document.substrate,
  ];
  let [low, high] = [400, 800];
  for (const medium of media) {
    const known = materialOf(medium, materials)?.rangeNm;
    // A constant of one wavelength is for the user to extend; it does not shrink the plot to a point.
    if (!known || known[0] === known[1]) continue;
    low = Math.max(low, known[0]);
    high = Math.min(high, known[1]);
  }
  return low < high ? [Math.ceil(low), Math.floor(high)] : [400, 800];
}

function roundUp(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  return Number(([1, 2, 5, 10].find((lead) => lead * power >= value)! * power).toPrecision(6));
}

/** What is wrong with an axis, by field; empty when it can be swept. */
export function axisProblems(axis: SweepAxis): Partial<Record<'from' | 'to' | 'points', string>> {
  const parsed = axisSchema.safeParse(axis);
  const problems: Partial<Record<'from' | 'to' | 'points', string>> = {};
  for (const issue of parsed.error?.issues ?? []) {
    const [field] = issue.path;
    if (field === 'from' || field === 'to' || field === 'points') problems[field] = issue.message;
  }
  if (axis.points > 1 && axis.from === axis.to && !problems.to) problems.to = 'must differ from the start';
  return problems;
}

/** Bytes of a preview's request that are still quick to send and read. */
const PREVIEW_BYTES = 1_500_000;
/** Bytes of a case beside its layers, about. */
const CASE_BYTES = 300;
/** States of one reading at most: given, m = 0, reversed. */
const STATES = 3;

/**
 * Points of the live preview: those of the axis up to PREVIEW_POINTS, fewer for an axis that needs a copy of a long
 * film at each point, or where each point is an average of many.
 */
export function previewPoints(axis: SweepAxis, document: StackDocument): number {
  return previewGrid({ axis, second: null, family: null }, document).axis;
}

export type PreviewAxes = { axis: SweepAxis; second: SweepAxis | null; family: SweepAxis | null };

/** Points along each axis of a preview; the run that is kept has as many as are asked for. */
export function previewGrid({ axis, second, family }: PreviewAxes, document: StackDocument) {
  const curves = family?.points ?? 1;
  const most = second ? MAP_PREVIEW_POINTS : family ? PREVIEW_POINTS / 2 : PREVIEW_POINTS;
  const all = LIMITS.httpPoints / (STATES * spreadNodeCount(document) * curves);
  const bytes = JSON.stringify(document.layers).length + CASE_BYTES;
  const copies = PREVIEW_BYTES / (STATES * bytes * curves);
  const inCase = axis.kind === 'wavelength' || axis.kind === 'angle';
  const within = (count: number) => Math.max(2, Math.floor(count));
  if (!second)
    return { axis: Math.min(axis.points, most, within(all), inCase ? most : within(copies)), second: 1 };
  // The second axis takes a copy of the film at each value, the first one too where it is not a list in a case.
  const side = Math.min(most, within(Math.sqrt(all)), within(inCase ? copies : Math.sqrt(copies)));
  return { axis: Math.min(axis.points, side), second: Math.min(second.points, side) };
}
