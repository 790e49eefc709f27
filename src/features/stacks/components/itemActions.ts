import type { StackBlock, StackDocument, StackItem } from '../../../../shared/stack.ts';
import type { MenuItem } from '../../../components/Menu.tsx';
import type { EditDocument } from '../hooks/useStackEditor.ts';
import {
  copyItem,
  findItem,
  insertBeside,
  isBlock,
  moveStep,
  newItemId,
  removeItem,
  unwrapBlock,
  withLayer,
  wrapInBlock,
} from '../model/items.ts';
import type { Side } from '../model/items.ts';
import { layerLike } from '../model/newStackItems.ts';

/** Moves an item one step and keeps the keyboard on its handle, which may stand in another block afterwards. */
export function stepItem(
  edit: EditDocument,
  announce: (text: string) => void,
  item: StackItem,
  direction: 'up' | 'down',
): void {
  edit((document) => {
    const layers = moveStep(document.layers, item.id, direction);
    return layers === null ? document : { ...document, layers };
  }, null);
  announce(`Moved ${direction}`);
  requestAnimationFrame(() => {
    document.querySelector<HTMLElement>(`[data-handle="${item.id}"]`)?.focus();
  });
}

/** Everything the menu of a layer or block offers. */
export function itemMenu(item: StackItem, edit: EditDocument, announce: (text: string) => void): MenuItem[] {
  const change = (said: string, layers: (document: StackDocument) => StackItem[]) => () => {
    edit((document) => ({ ...document, layers: layers(document) }), null);
    announce(said);
  };
  const add = (side: Side) =>
    change(`Layer added ${side}`, (document) => {
      const like = layerLike(findItem(document.layers, item.id) ?? undefined, document.substrate);
      return insertBeside(document.layers, item.id, side, like);
    });
  const action = (label: string, onSelect: () => void): MenuItem => ({ kind: 'action', label, onSelect });
  return [
    action('Add a layer above', add('above')),
    action('Add a layer below', add('below')),
    action(
      'Duplicate',
      change('Duplicated', (document) => insertBeside(document.layers, item.id, 'below', copyItem(item))),
    ),
    { kind: 'separator', id: 'moves' },
    action('Move up (Alt + ↑)', () => stepItem(edit, announce, item, 'up')),
    action('Move down (Alt + ↓)', () => stepItem(edit, announce, item, 'down')),
    action(
      'Repeat as a block',
      change('Wrapped in a block', (document) => wrapInBlock(document.layers, item.id, newItemId())),
    ),
    ...(isBlock(item) ? blockActions(item, change) : layerActions(item, edit)),
    { kind: 'separator', id: 'end' },
    {
      kind: 'action',
      label: isBlock(item) ? 'Remove the block' : 'Remove',
      danger: true,
      onSelect: change('Removed', (document) => removeItem(document.layers, item.id)),
    },
  ];
}

function blockActions(
  block: StackBlock,
  change: (said: string, layers: (document: StackDocument) => StackItem[]) => () => void,
): MenuItem[] {
  return [
    {
      kind: 'action',
      label: 'Dissolve the block',
      onSelect: change('Block dissolved', (document) => unwrapBlock(document.layers, block.id)),
    },
  ];
}

function layerActions(layer: Exclude<StackItem, StackBlock>, edit: EditDocument): MenuItem[] {
  if (layer.m === undefined) return [];
  return [
    {
      kind: 'choice',
      label: 'Fixed: keeps its m',
      checked: layer.fixed === true,
      onSelect: () =>
        edit((document) => withLayer(document, layer.id, { fixed: layer.fixed !== true }), null),
    },
  ];
}
