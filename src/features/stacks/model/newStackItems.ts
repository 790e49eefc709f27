import type { StackItem, StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { isBlock, newItemId } from './items.ts';

/** The layer that "add" puts beside an item: of the same material, so that only what differs has to be changed. */
export function layerLike(item: StackItem | undefined, fallback: StackMedium): StackLayer {
  if (item === undefined) return { id: newItemId(), medium: fallback, thicknessNm: 10 };
  if (isBlock(item)) return layerLike(item.layers.at(-1), fallback);
  const { medium, thicknessNm, m, thermal } = item;
  return {
    id: newItemId(),
    medium,
    thicknessNm,
    ...(m === undefined ? {} : { m }),
    ...(thermal === undefined ? {} : { thermal }),
  };
}
