import { toComplex } from '../../../../shared/complex.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { formatFormula, formatPlain } from '../../../lib/format.ts';

/** What names a material: of the library, or of those that a design was computed with. */
export type NamedMaterial = { id: string; formula: string };

/** A medium in a word: the formula, the label of typed-in constants, else the constants. */
export function mediumWords(medium: StackMedium, materials: readonly NamedMaterial[]): string {
  if (medium.material !== undefined) {
    const known = materials.find(({ id }) => id === medium.material);
    return known ? formatFormula(known.formula) : medium.material;
  }
  if (medium.label) return medium.label;
  if (medium.mixture) return medium.mixture.parts.map((part) => mediumWords(part, materials)).join('/');
  if (medium.index === undefined || (typeof medium.index === 'object' && 'samples' in medium.index)) {
    return 'typed-in constants';
  }
  const [n, k] = toComplex(medium.index);
  return k === 0 ? `n ${formatPlain(n)}` : `${formatPlain(n)} + ${formatPlain(k)}i`;
}

/** Every layer once, light side first; blocks are not expanded. */
export function drawnLayers(items: readonly StackItem[]): StackLayer[] {
  return items.flatMap((item) => ('layers' in item ? drawnLayers(item.layers) : [item]));
}

/** A layer as the form and the tables name it: `1 Pt (cap)`. */
export function layerWords(
  document: StackDocument,
  layerId: string,
  materials: readonly NamedMaterial[],
): string {
  const layers = drawnLayers(document.layers);
  const position = layers.findIndex(({ id }) => id === layerId);
  const layer = layers[position];
  if (!layer) return layerId;
  const name = `${position + 1} ${mediumWords(layer.medium, materials)}`;
  return layer.note ? `${name} (${layer.note})` : name;
}

/** The film with other thicknesses. */
export function withThicknesses(
  document: StackDocument,
  layerIds: readonly string[],
  thicknessesNm: readonly number[],
): StackDocument {
  const change = (item: StackItem): StackItem => {
    if ('layers' in item) return { ...item, layers: item.layers.map(change) };
    const thicknessNm = thicknessesNm[layerIds.indexOf(item.id)];
    return thicknessNm === undefined ? item : { ...item, thicknessNm };
  };
  return { ...document, layers: document.layers.map(change) };
}
