import { SUBSTRATE } from '../../shared/run.ts';
import type { SweepAxes, SweepAxis, UsedMaterial } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import { axisUnitOf } from '../../shared/resultFormat.ts';
import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** The materials of a run, by which its layers are called. */
export type NamedMaterials = readonly Pick<UsedMaterial, 'id' | 'formula'>[];

/** Such as "wavelength from 400 to 800 nm in 401 points". */
export function describeAxis(axis: SweepAxis, document: StackDocument, materials: NamedMaterials): string {
  const spacing = axis.spacing === 'log' ? ', evenly on a log scale' : '';
  return `${quantityOf(axis, document, materials)} from ${axis.from} to ${axis.to}${unitOf(axis)} in ${axis.points} points${spacing}`;
}

/** The name of a run whose maker gave none. */
export function runNameFor(
  axes: SweepAxes,
  document: StackDocument,
  materials: NamedMaterials,
  stackName: string | null,
): string {
  const sweep = axesOf(axes)
    .map(({ axis }) => `${quantityOf(axis, document, materials)} ${axis.from} to ${axis.to}${unitOf(axis)}`)
    .join(' × ');
  const name = stackName === null ? sweep : `${stackName}: ${sweep}`;
  return name.slice(0, 120);
}

/** Such as "thickness of Pt", or what the axis says of every layer. */
export function quantityOf(axis: SweepAxis, document: StackDocument, materials: NamedMaterials): string {
  switch (axis.kind) {
    case 'wavelength':
    case 'angle':
      return axis.kind;
    case 'thickness':
      return `thickness${of(axis.layerId, document, materials)}`;
    case 'direction':
      return `direction of m in ${axis.plane}${of(axis.layerId, document, materials)}`;
    case 'voigtScale':
      return `scale of Q${of(axis.layerId, document, materials)}`;
    case 'repeat':
      return 'repeats of the block';
    case 'graded':
      return `interface width above ${nameOf(axis.layerId, document, materials) ?? 'the layer'}`;
  }
}

function unitOf(axis: SweepAxis): string {
  const unit = axisUnitOf(axis);
  return unit === '1' ? '' : ` ${unit}`;
}

function of(layerId: string | undefined, document: StackDocument, materials: NamedMaterials): string {
  const name = layerId === undefined ? undefined : nameOf(layerId, document, materials);
  return name === undefined ? '' : ` of ${name}`;
}

/** Such as "Pt (cap)": a film often has two layers of one material. */
function nameOf(layerId: string, document: StackDocument, materials: NamedMaterials): string | undefined {
  const layer = findLayer(document.layers, layerId);
  if (!layer) return layerId === SUBSTRATE ? 'the substrate' : undefined;
  const { label, material } = layer.medium;
  const name = label ?? materials.find(({ id }) => id === material)?.formula ?? material;
  return name !== undefined && layer.note ? `${name} (${layer.note})` : name;
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
