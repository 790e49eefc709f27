import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../../../shared/stack.ts';

/** A version of a material that is to stand in a film. */
type Pinned = { material: string; version: number };

/** The film with one material in the place of others, in layers, oxides, mixtures, substrate and all around. */
export function exchangeMaterial(
  document: StackDocument,
  outgoing: readonly string[],
  incoming: Pinned,
): StackDocument {
  const exchange = <Part extends { material?: string | undefined }>(part: Part): Part =>
    part.material !== undefined && outgoing.includes(part.material) ? { ...part, ...incoming } : part;
  const mediumOf = (medium: StackMedium): StackMedium => {
    const { mixture } = medium;
    if (!mixture) return exchange(medium);
    const [first, second] = mixture.parts;
    return { ...medium, mixture: { ...mixture, parts: [exchange(first), exchange(second)] } };
  };
  const itemOf = (item: StackItem): StackItem =>
    'layers' in item
      ? { ...item, layers: item.layers.map(itemOf) }
      : {
          ...item,
          medium: mediumOf(item.medium),
          ...(item.oxide ? { oxide: { ...item.oxide, medium: mediumOf(item.oxide.medium) } } : {}),
        };
  const { backside } = document;
  return {
    ...document,
    incident: mediumOf(document.incident),
    layers: document.layers.map(itemOf),
    substrate: mediumOf(document.substrate),
    ...(backside ? { backside: { ...backside, exit: mediumOf(backside.exit) } } : {}),
  };
}

type UsedMedium = { material: string; assumeConstant: boolean; magnetized: boolean };

/** Every use of a material of the library, as light meets them. */
function usesOf(document: StackDocument): UsedMedium[] {
  const usesIn = (medium: StackMedium, magnetized: boolean): UsedMedium[] =>
    [medium, ...(medium.mixture?.parts ?? [])].flatMap(({ material, assumeConstant = false }) =>
      material === undefined ? [] : [{ material, assumeConstant, magnetized }],
    );
  const usesAt = (layer: StackLayer) => [
    ...(layer.oxide ? usesIn(layer.oxide.medium, false) : []),
    ...usesIn(layer.medium, layer.m !== undefined),
  ];
  const usesOfItem = (item: StackItem): UsedMedium[] =>
    'layers' in item ? item.layers.flatMap(usesOfItem) : usesAt(item);
  return [
    ...usesIn(document.incident, false),
    ...document.layers.flatMap(usesOfItem),
    ...usesIn(document.substrate, document.substrateM !== undefined),
    ...(document.backside ? usesIn(document.backside.exit, false) : []),
  ];
}

/** Ids of the materials in a film, each once, as light meets them. */
export function materialsIn(document: StackDocument): string[] {
  return [...new Set(usesOf(document).map(({ material }) => material))];
}

type Known = Pick<MaterialSummary, 'rangeNm' | 'voigtRangeNm'>;

/**
 * The wavelengths, nm, at which every constant that a film needs is known: n and k of all, Q of what is magnetized.
 * A constant of one wavelength that a layer uses everywhere (`assumeConstant`) asks for nothing. Null for none;
 * `widest` when nothing of the library limits it.
 */
export function commonRangeNm(
  document: StackDocument,
  library: ReadonlyMap<string, Known>,
  widest: readonly [number, number],
): [number, number] | null {
  let [low, high] = widest;
  for (const { material, assumeConstant, magnetized } of usesOf(document)) {
    const known = library.get(material);
    for (const range of [known?.rangeNm, magnetized ? known?.voigtRangeNm : null]) {
      if (!range || (assumeConstant && range[0] === range[1])) continue;
      [low, high] = [Math.max(low, range[0]), Math.min(high, range[1])];
    }
  }
  return low <= high ? [low, high] : null;
}
