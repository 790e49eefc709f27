import type { Vector } from './complex.ts';
import { SUBSTRATE } from './run.ts';
import type { SweepAxis } from './run.ts';
import type { StackBlock, StackDocument, StackItem, StackLayer } from './stack.ts';

/**
 * The document with one value of a swept quantity put in, in the axis's own unit (nm, deg or a plain number).
 * Names that the document does not have change nothing; the server refuses them before.
 */
export function applyAxis(document: StackDocument, axis: SweepAxis, value: number): StackDocument {
  switch (axis.kind) {
    case 'wavelength':
      return withPoint(document, { wavelengthNm: value });
    case 'angle':
      return withPoint(document, { angleDeg: value });
    case 'thickness':
      return mapLayers(document, (layer) =>
        layer.id === axis.layerId ? { ...layer, thicknessNm: value } : layer,
      );
    case 'repeat':
      return mapBlocks(document, (block) =>
        block.id === axis.blockId ? { ...block, repeat: value } : block,
      );
    case 'graded':
      return axis.layerId === SUBSTRATE
        ? { ...document, substrateGradedNm: value }
        : mapLayers(document, (layer) => (layer.id === axis.layerId ? { ...layer, gradedNm: value } : layer));
    case 'voigtScale':
      return scaleVoigt(document, axis.layerId, value);
    case 'direction':
      return turnMagnetization(document, axis, value);
  }
}

function withPoint(document: StackDocument, change: Partial<StackDocument['workingPoint']>): StackDocument {
  return { ...document, workingPoint: { ...document.workingPoint, ...change } };
}

/** An axis over every layer multiplies what a layer has of its own. */
function scaleVoigt(document: StackDocument, layerId: string | undefined, value: number): StackDocument {
  const scaled = mapLayers(document, (layer) => {
    if (layerId === undefined) return { ...layer, voigtScale: (layer.voigtScale ?? 1) * value };
    return layer.id === layerId ? { ...layer, voigtScale: value } : layer;
  });
  if (layerId === undefined) {
    return { ...scaled, substrateVoigtScale: (document.substrateVoigtScale ?? 1) * value };
  }
  return layerId === SUBSTRATE ? { ...scaled, substrateVoigtScale: value } : scaled;
}

/**
 * The magnetization in a swept direction, of the length that it has at the working point. The direction of the axis
 * is the one that light sees: where the working point reverses m, the drawn one is its opposite.
 */
function turnMagnetization(
  document: StackDocument,
  { plane, layerId }: SweepAxis & { kind: 'direction' },
  angleDeg: number,
): StackDocument {
  const { magnetization } = document.workingPoint;
  const direction = unitVector(plane, angleDeg);
  const isSwept = (id: string, fixed: boolean) => (layerId === undefined ? !fixed : id === layerId);
  const turned = (id: string, m: Vector, fixed: boolean): Vector => {
    const drawn = magnetization.mode === 'direction' && !fixed ? magnetization.m : m;
    if (!isSwept(id, fixed)) return drawn;
    const length = Math.hypot(...drawn);
    const sign = magnetization.mode === 'reversed' && !fixed ? -1 : 1;
    return [
      0 + sign * length * direction[0],
      0 + sign * length * direction[1],
      0 + sign * length * direction[2],
    ];
  };
  const result = mapLayers(document, (layer) =>
    layer.m === undefined ? layer : { ...layer, m: turned(layer.id, layer.m, layer.fixed ?? false) },
  );
  return {
    ...result,
    ...(document.substrateM === undefined
      ? {}
      : { substrateM: turned(SUBSTRATE, document.substrateM, false) }),
    workingPoint: {
      ...document.workingPoint,
      // A common direction has been put into the layers.
      magnetization: magnetization.mode === 'direction' ? { mode: 'drawn' } : magnetization,
    },
  };
}

function unitVector(plane: (SweepAxis & { kind: 'direction' })['plane'], angleDeg: number): Vector {
  const [along, across] = cosineAndSine(angleDeg);
  switch (plane) {
    case 'xz':
      return [across, 0, along];
    case 'yz':
      return [0, across, along];
    case 'xy':
      return [along, across, 0];
  }
}

/** Exact at the multiples of 90 deg, where symmetries of the stack depend on a component that is 0. */
function cosineAndSine(angleDeg: number): [number, number] {
  const quarters = (((angleDeg / 90) % 4) + 4) % 4;
  if (Number.isInteger(quarters)) return [[1, 0, -1, 0][quarters]!, [0, 1, 0, -1][quarters]!];
  const angle = (angleDeg * Math.PI) / 180;
  return [Math.cos(angle), Math.sin(angle)];
}

function mapLayers(document: StackDocument, change: (layer: StackLayer) => StackLayer): StackDocument {
  const changeItem = (item: StackItem): StackItem =>
    'layers' in item ? { ...item, layers: item.layers.map(changeItem) } : change(item);
  return { ...document, layers: document.layers.map(changeItem) };
}

function mapBlocks(document: StackDocument, change: (block: StackBlock) => StackBlock): StackDocument {
  const changeItem = (item: StackItem): StackItem =>
    'layers' in item ? change({ ...item, layers: item.layers.map(changeItem) }) : item;
  return { ...document, layers: document.layers.map(changeItem) };
}
