import type { Issue } from '../../shared/error.ts';
import { applyAxis } from '../../shared/applyAxis.ts';
import { SUBSTRATE } from '../../shared/run.ts';
import type { SweepAxes, SweepAxis } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import type { AxisField } from '../../shared/runAxes.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../shared/stack.ts';
import { findLayer } from './runNames.ts';

/** Whether what each axis sweeps is there in the stack, and may take every value of the axis. */
export function checkSweptParts(document: StackDocument, axes: SweepAxes): Issue[] {
  return axesOf(axes).flatMap(({ field, axis }) => checkSweptPart(document, field, axis));
}

function checkSweptPart(document: StackDocument, field: AxisField, axis: SweepAxis): Issue[] {
  switch (axis.kind) {
    case 'wavelength':
    case 'angle':
      return [];
    case 'thickness':
      return checkThickness(document, field, axis);
    case 'graded':
      return axis.layerId === SUBSTRATE ? [] : checkLayer(document, field, axis.layerId);
    case 'repeat':
      return hasBlock(document.layers, axis.blockId)
        ? []
        : [
            {
              path: `${field}.blockId`,
              message: `the stack has no repeated block with the id ${axis.blockId}`,
            },
          ];
    case 'direction':
      return checkMagnetic(document, field, axis, 'a magnetization to turn', (m) => m !== undefined);
    case 'voigtScale':
      return checkMagnetic(document, field, axis, 'a Voigt constant to scale', (_m, medium) =>
        hasVoigt(medium),
      );
  }
}

function checkLayer(document: StackDocument, field: AxisField, layerId: string): Issue[] {
  return findLayer(document.layers, layerId)
    ? []
    : [{ path: `${field}.layerId`, message: `the stack has no layer with the id ${layerId}` }];
}

/** The layer must be thick enough at every point for what has become of its parts. */
function checkThickness(
  document: StackDocument,
  field: AxisField,
  axis: SweepAxis & { kind: 'thickness' },
): Issue[] {
  const layer = findLayer(document.layers, axis.layerId);
  if (!layer) return checkLayer(document, field, axis.layerId);
  const { oxide, dead } = layer;
  const usedNm = (oxide?.consumedNm ?? 0) + (dead?.topNm ?? 0) + (dead?.bottomNm ?? 0);
  return (['from', 'to'] as const)
    .filter((end) => axis[end] < usedNm)
    .map((end) => ({
      path: `${field}.${end}`,
      message: `must be at least the ${usedNm} nm that the oxide and the dead parts of the layer take, got ${axis[end]}`,
    }));
}

function checkMagnetic(
  document: StackDocument,
  field: AxisField,
  { kind, layerId }: SweepAxis & { kind: 'direction' | 'voigtScale' },
  what: string,
  holds: (m: StackLayer['m'], medium: StackMedium) => boolean,
): Issue[] {
  const substrateHolds = holds(document.substrateM, document.substrate);
  if (layerId === undefined) {
    const free = (layer: StackLayer) => kind === 'voigtScale' || !layer.fixed;
    const some =
      substrateHolds || layersOf(document.layers).some((one) => free(one) && holds(one.m, one.medium));
    const which = kind === 'direction' ? 'no layer that is not fixed has' : 'no layer has';
    return some ? [] : [{ path: `${field}.kind`, message: `${which} ${what}` }];
  }
  const layer = findLayer(document.layers, layerId);
  if (!layer && layerId !== SUBSTRATE) return checkLayer(document, field, layerId);
  const ok = layer ? holds(layer.m, layer.medium) : substrateHolds;
  return ok ? [] : [{ path: `${field}.layerId`, message: `this layer has no ${what.replace(/^an? /, '')}` }];
}

function hasVoigt({ voigt, material, mixture }: StackMedium): boolean {
  if (mixture) return mixture.parts.some((part) => part.voigt !== undefined || part.material !== undefined);
  return voigt !== undefined || material !== undefined;
}

function layersOf(items: StackItem[]): StackLayer[] {
  return items.flatMap((item) => ('layers' in item ? layersOf(item.layers) : [item]));
}

function hasBlock(items: StackItem[], blockId: string): boolean {
  return items.some((item) => 'layers' in item && (item.id === blockId || hasBlock(item.layers, blockId)));
}

/** A stack at a corner of the axes, and the end of an axis that is to be blamed for what is wrong there. */
export type Corner = { document: StackDocument; path: string };

/**
 * The stacks at the ends of the axes that change the stack, each end alone first, then all together: what holds at
 * all of them holds between.
 */
export function cornersOf(document: StackDocument, axes: SweepAxes): Corner[] {
  const changing = axesOf(axes).filter(({ axis }) => axis.kind !== 'wavelength' && axis.kind !== 'angle');
  const alone = changing.flatMap(({ field, axis }) => cornersAlong({ document, path: '' }, field, axis));
  const together = changing.reduce<Corner[]>(
    (corners, { field, axis }) => corners.flatMap((corner) => cornersAlong(corner, field, axis)),
    [{ document, path: '' }],
  );
  return changing.length > 1 ? [...alone, ...together] : alone;
}

function cornersAlong({ document }: Corner, field: AxisField, axis: SweepAxis): Corner[] {
  const ends = axis.points === 1 ? (['from'] as const) : (['from', 'to'] as const);
  return ends.map((end) => ({
    document: applyAxis(document, axis, axis[end]),
    path: `${field}.${end}`,
  }));
}
