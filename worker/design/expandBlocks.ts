import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** Layers that may each have a random error of their own; beyond, the repetitions of a block share theirs. */
export const MOST_SINGLE_LAYERS = 400;

export type FlatFilm = {
  document: StackDocument;
  /** The layers of `document`, light side first, each with the id that it has in the drawing. */
  layers: { layer: StackLayer; drawnId: string }[];
  /** False where blocks stay blocks because there are too many layers. */
  isExpanded: boolean;
};

/**
 * The film with every repetition of a block as layers of its own, so that each can be off by itself. A film of more than
 * MOST_SINGLE_LAYERS layers stays as it is drawn.
 */
export function expandBlocks(document: StackDocument): FlatFilm {
  const flat: FlatFilm['layers'] = [];
  const visit = (items: StackItem[]): boolean =>
    items.every((item) => {
      if (flat.length >= MOST_SINGLE_LAYERS) return false;
      if (!('layers' in item)) {
        flat.push({ layer: { ...item, id: `${flat.length} ${item.id}` }, drawnId: item.id });
        return true;
      }
      return Array.from({ length: item.repeat }).every(() => visit(item.layers));
    });
  if (visit(document.layers)) {
    return {
      document: { ...document, layers: flat.map(({ layer }) => layer) },
      layers: flat,
      isExpanded: true,
    };
  }
  return {
    document,
    layers: drawnLayers(document.layers).map((layer) => ({ layer, drawnId: layer.id })),
    isExpanded: false,
  };
}

/** Every layer as drawn, each layer of a block once. */
export function drawnLayers(items: StackItem[]): StackLayer[] {
  return items.flatMap((item) => ('layers' in item ? drawnLayers(item.layers) : [item]));
}
