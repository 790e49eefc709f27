import { axisSchema } from '../../../../shared/run.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { findItem, isBlock, listLayers } from './items.ts';
import { materialOf } from './media.ts';
import type { Materials } from './media.ts';

/** Points of the live preview at most; the run that is kept has as many as are asked for. */
export const PREVIEW_POINTS = 200;

/** The values of an axis at `points` points: ends exact, the values between never beyond them. */
export function axisGrid(axis: SweepAxis, points: number): number[] {
  if (points <= 1) return [axis.from];
  const [low, high] = [Math.min(axis.from, axis.to), Math.max(axis.from, axis.to)];
  return Array.from({ length: points }, (_, index) => {
    if (index === 0) return axis.from;
    if (index === points - 1) return axis.to;
    const share = index / (points - 1);
    const value =
      axis.spacing === 'linear'
        ? axis.from + (axis.to - axis.from) * share
        : axis.from * Math.exp(share * Math.log(axis.to / axis.from));
    return Math.min(Math.max(value, low), high);
  });
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
    default:
      return null;
  }
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
/** States of one reading at most: given, m = 0, reversed. */
const STATES = 3;

/**
 * Points of the live preview: those of the axis up to PREVIEW_POINTS, fewer for a thickness of a film so long that
 * a copy of it for each point would be a slow request.
 */
export function previewPoints(axis: SweepAxis, document: StackDocument): number {
  const most = Math.min(axis.points, PREVIEW_POINTS);
  if (axis.kind !== 'thickness') return most;
  const bytes = JSON.stringify(document.layers).length;
  return Math.max(2, Math.min(most, Math.floor(PREVIEW_BYTES / (STATES * Math.max(bytes, 1)))));
}
