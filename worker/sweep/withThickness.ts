import type { StackDocument, StackItem } from '../../shared/stack.ts';

/** The document with another thickness of one layer. */
export function withThickness(document: StackDocument, layerId: string, thicknessNm: number): StackDocument {
  const change = (item: StackItem): StackItem => {
    if ('layers' in item) return { ...item, layers: item.layers.map(change) };
    return item.id === layerId ? { ...item, thicknessNm } : item;
  };
  return { ...document, layers: document.layers.map(change) };
}
