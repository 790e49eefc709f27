import { SUBSTRATE } from '../../../../shared/run.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { listBlocks, listLayers } from './items.ts';
import { mediumName } from './media.ts';
import type { Materials } from './media.ts';

/** What an axis can be of: a layer, a block, the substrate, or '' for every magnetic layer. */
export type AxisTarget = { id: string; label: string };

export const axisKindNames: Record<AxisKind, string> = {
  wavelength: 'wavelength',
  angle: 'angle of incidence',
  thickness: 'thickness',
  direction: 'direction of m',
  voigtScale: 'Q scale',
  repeat: 'repeats',
  graded: 'interface width',
};

/** The choices of "of" for a kind of axis; empty where there is nothing to choose. */
export function axisTargets(kind: AxisKind, document: StackDocument, materials: Materials): AxisTarget[] {
  const layers = listLayers(document.layers).map((layer, index) => ({
    id: layer.id,
    magnetic: layer.m !== undefined,
    label: `${index + 1}. ${mediumName(layer.medium, materials)}${layer.note ? `, ${layer.note}` : ''}`,
  }));
  const substrate = { id: SUBSTRATE, label: `${mediumName(document.substrate, materials)}, substrate` };
  switch (kind) {
    case 'wavelength':
    case 'angle':
      return [];
    case 'thickness':
      return layers;
    case 'graded':
      return [...layers.slice(1), substrate];
    case 'repeat':
      return listBlocks(document.layers).map((block) => ({
        id: block.id,
        label: `block of ${listLayers(block.layers)
          .map(({ medium }) => mediumName(medium, materials))
          .slice(0, 4)
          .join(' / ')}`,
      }));
    case 'direction':
    case 'voigtScale':
      return [
        { id: '', label: 'every magnetic layer' },
        ...layers.filter(({ magnetic }) => magnetic),
        ...(document.substrateM === undefined ? [] : [substrate]),
      ];
  }
}

/** What an axis is of, as one of its targets. */
export function targetOf(axis: SweepAxis): string {
  if (axis.kind === 'repeat') return axis.blockId;
  return 'layerId' in axis ? (axis.layerId ?? '') : '';
}

/** The swept layer as plots name it; undefined where the axis is of nothing in particular. */
export function targetName(
  axis: SweepAxis,
  document: StackDocument,
  materials: Materials,
): string | undefined {
  const id = targetOf(axis);
  if (id === '' || axis.kind === 'repeat') return undefined;
  if (id === SUBSTRATE) return mediumName(document.substrate, materials);
  const layer = listLayers(document.layers).find((one) => one.id === id);
  return layer && mediumName(layer.medium, materials);
}
