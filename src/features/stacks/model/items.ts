import type { StackBlock, StackDocument, StackItem, StackLayer } from '../../../../shared/stack.ts';

/**
 * The tree of layers and blocks of a stack. Every function returns a new list and shares what did not change, so
 * that an unchanged row is not drawn again. Items are named by id, never by position.
 */
export type Side = 'above' | 'below';

export function isBlock(item: StackItem): item is StackBlock {
  return 'layers' in item;
}

/** An id that no other item of any stack has by chance. */
export function newItemId(): string {
  return crypto.randomUUID().slice(0, 13);
}

export function findItem(items: readonly StackItem[], id: string): StackItem | null {
  for (const item of items) {
    if (item.id === id) return item;
    const inner = isBlock(item) ? findItem(item.layers, id) : null;
    if (inner) return inner;
  }
  return null;
}

/** Every layer once, in the order in which light meets them; blocks are not expanded. */
export function listLayers(items: readonly StackItem[]): StackLayer[] {
  return items.flatMap((item) => (isBlock(item) ? listLayers(item.layers) : [item]));
}

/** Every block, outer ones before those inside them. */
export function listBlocks(items: readonly StackItem[]): StackBlock[] {
  return items.flatMap((item) => (isBlock(item) ? [item, ...listBlocks(item.layers)] : []));
}

/** Replaces the item of that id by what `change` makes of it: none, one or several. */
export function replaceItem(
  items: readonly StackItem[],
  id: string,
  change: (item: StackItem) => StackItem[],
): StackItem[] {
  return items.flatMap((item) => {
    if (item.id === id) return change(item);
    if (!isBlock(item) || findItem(item.layers, id) === null) return [item];
    return [{ ...item, layers: replaceItem(item.layers, id, change) }];
  });
}

export function insertBeside(
  items: readonly StackItem[],
  id: string,
  side: Side,
  added: StackItem,
): StackItem[] {
  return replaceItem(items, id, (item) => (side === 'above' ? [added, item] : [item, added]));
}

export function removeItem(items: readonly StackItem[], id: string): StackItem[] {
  return replaceItem(items, id, () => []);
}

/** The same item with ids of its own, inside blocks too. */
export function copyItem(item: StackItem): StackItem {
  return isBlock(item)
    ? { ...item, id: newItemId(), layers: item.layers.map(copyItem) }
    : { ...item, id: newItemId() };
}

export function wrapInBlock(items: readonly StackItem[], id: string, blockId: string): StackItem[] {
  return replaceItem(items, id, (item) => [{ id: blockId, repeat: 2, layers: [item] }]);
}

/** The block's layers take its place, once. */
export function unwrapBlock(items: readonly StackItem[], id: string): StackItem[] {
  return replaceItem(items, id, (item) => (isBlock(item) ? item.layers : [item]));
}

/**
 * Puts an item above or below another one, wherever that stands. Moving a block into itself changes nothing.
 */
export function moveBeside(
  items: readonly StackItem[],
  id: string,
  targetId: string,
  side: Side,
): StackItem[] {
  const moved = findItem(items, id);
  const inside = moved !== null && isBlock(moved) && findItem(moved.layers, targetId) !== null;
  if (moved === null || id === targetId || inside || findItem(items, targetId) === null) return [...items];
  return insertBeside(removeItem(items, id), targetId, side, moved);
}

/** Puts an item into a block, as its first or last. */
export function moveInto(
  items: readonly StackItem[],
  id: string,
  blockId: string,
  end: 'first' | 'last',
): StackItem[] {
  const moved = findItem(items, id);
  const target = findItem(items, blockId);
  const inside = moved !== null && isBlock(moved) && findItem(moved.layers, blockId) !== null;
  if (moved === null || target === null || !isBlock(target) || id === blockId || inside) return [...items];
  return replaceItem(removeItem(items, id), blockId, (block) => {
    if (!isBlock(block)) return [block];
    return [{ ...block, layers: end === 'first' ? [moved, ...block.layers] : [...block.layers, moved] }];
  });
}

/**
 * One step up or down, as the keyboard moves an item: past a layer, into a block that stands next, out of a block
 * at its end. `null` where there is no step left.
 */
export function moveStep(
  items: readonly StackItem[],
  id: string,
  direction: 'up' | 'down',
): StackItem[] | null {
  const parent = parentOf(items, id);
  const siblings = parent?.layers ?? items;
  const position = siblings.findIndex((item) => item.id === id);
  if (position < 0) return null;
  const neighbour = siblings[direction === 'up' ? position - 1 : position + 1];
  const side: Side = direction === 'up' ? 'above' : 'below';
  if (neighbour === undefined) return parent === null ? null : moveBeside(items, id, parent.id, side);
  const moved = siblings[position]!;
  if (isBlock(neighbour) && !isBlock(moved)) {
    return moveInto(items, id, neighbour.id, direction === 'up' ? 'last' : 'first');
  }
  return moveBeside(items, id, neighbour.id, side);
}

function parentOf(items: readonly StackItem[], id: string): StackBlock | null {
  for (const item of items) {
    if (!isBlock(item)) continue;
    if (item.layers.some((inner) => inner.id === id)) return item;
    const deeper = parentOf(item.layers, id);
    if (deeper) return deeper;
  }
  return null;
}

/** The document with one layer changed; a key set to undefined is left out of the layer. */
export function withLayer(document: StackDocument, id: string, patch: LayerPatch): StackDocument {
  const layers = replaceItem(document.layers, id, (item) => {
    if (isBlock(item)) return [item];
    const changed = { ...item, ...patch };
    return [withoutEmpty(changed)];
  });
  return { ...document, layers };
}

/** Optional keys that say nothing are left out, so that equal layers are written alike. */
function withoutEmpty({ m, fixed, thermal, note, gradedNm, dead, oxide, ...layer }: LayerDraft): StackLayer {
  return {
    ...layer,
    ...(m === undefined ? {} : { m }),
    ...(fixed ? { fixed } : {}),
    ...(thermal && m !== undefined ? { thermal } : {}),
    ...(note ? { note } : {}),
    ...(gradedNm ? { gradedNm } : {}),
    ...(dead && m !== undefined && dead.topNm + dead.bottomNm > 0 ? { dead } : {}),
    ...(oxide ? { oxide } : {}),
  };
}

type LayerDraft = Pick<StackLayer, 'id' | 'medium' | 'thicknessNm'> & {
  [Key in keyof Omit<StackLayer, 'id' | 'medium' | 'thicknessNm'>]: StackLayer[Key] | undefined;
};

export type LayerPatch = { [Key in Exclude<keyof StackLayer, 'id'>]?: StackLayer[Key] | undefined } & {
  medium?: StackLayer['medium'];
  thicknessNm?: number;
};

export function withRepeat(document: StackDocument, id: string, repeat: number): StackDocument {
  return {
    ...document,
    layers: replaceItem(document.layers, id, (item) => [isBlock(item) ? { ...item, repeat } : item]),
  };
}
