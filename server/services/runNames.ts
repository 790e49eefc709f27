import type { SweepAxis } from '../../shared/run.ts';
import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** Such as "wavelength from 400 to 800 nm in 401 points". */
export function describeAxis(axis: SweepAxis, document: StackDocument): string {
  const quantity = axis.kind === 'thickness' ? thicknessOf(axis.layerId, document) : axis.kind;
  const unit = axis.kind === 'angle' ? 'deg' : 'nm';
  const spacing = axis.spacing === 'log' ? ', evenly on a log scale' : '';
  return `${quantity} from ${axis.from} to ${axis.to} ${unit} in ${axis.points} points${spacing}`;
}

/** The name of a run whose maker gave none. */
export function runNameFor(axis: SweepAxis, document: StackDocument, stackName: string | null): string {
  const quantity = axis.kind === 'thickness' ? thicknessOf(axis.layerId, document) : axis.kind;
  const unit = axis.kind === 'angle' ? 'deg' : 'nm';
  const sweep = `${quantity} ${axis.from} to ${axis.to} ${unit}`;
  const name = stackName === null ? sweep : `${stackName}: ${sweep}`;
  return name.slice(0, 120);
}

function thicknessOf(layerId: string, document: StackDocument): string {
  const layer = findLayer(document.layers, layerId);
  const medium = layer?.medium.label ?? layer?.medium.material;
  return medium === undefined ? 'thickness' : `thickness of ${medium}`;
}

/** The layer with this id, in a block too; null when there is none. */
export function findLayer(items: StackItem[], layerId: string): StackLayer | null {
  for (const item of items) {
    if ('layers' in item) {
      const inner = findLayer(item.layers, layerId);
      if (inner) return inner;
    } else if (item.id === layerId) {
      return item;
    }
  }
  return null;
}
