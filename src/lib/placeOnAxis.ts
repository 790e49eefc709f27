import type { SweepAxis } from '../../shared/run.ts';
import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** The value that a film itself has of a swept quantity, in the axis's unit; null where it has no single one. */
export function placeOnAxis(axis: SweepAxis, document: StackDocument): number | null {
  switch (axis.kind) {
    case 'wavelength':
      return document.workingPoint.wavelengthNm;
    case 'angle':
      return document.workingPoint.angleDeg;
    case 'thickness':
      return layersIn(document.layers).find(({ id }) => id === axis.layerId)?.thicknessNm ?? null;
    case 'voigtScale':
      return 1;
    default:
      return null;
  }
}

function layersIn(items: readonly StackItem[]): StackLayer[] {
  return items.flatMap((item) => ('layers' in item ? layersIn(item.layers) : [item]));
}
