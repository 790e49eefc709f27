import type { StackItem } from '../../../../shared/stack.ts';
import { moveBeside, moveInto } from './items.ts';
import type { Side } from './items.ts';

/** A strip of the drawing that something can be dropped on: a layer, or the head or the foot of a block. */
export type DropRow = { id: string; kind: 'layer' | 'head' | 'foot'; top: number; bottom: number };
export type DropTarget = { id: string; side: Side | 'first' | 'last'; y: number };

/**
 * Where an item dropped at this height would go: above or below the row it is over, whichever edge is nearer; below
 * the head of a block is into the block, above its foot too.
 */
export function dropTarget(rows: readonly DropRow[], y: number): DropTarget | null {
  let best: (DropTarget & { distance: number }) | null = null;
  for (const row of rows) {
    const edges = [
      { side: row.kind === 'foot' ? ('last' as const) : ('above' as const), y: row.top },
      { side: row.kind === 'head' ? ('first' as const) : ('below' as const), y: row.bottom },
    ];
    for (const edge of edges) {
      const distance = Math.abs(edge.y - y);
      if (best === null || distance < best.distance) best = { id: row.id, ...edge, distance };
    }
  }
  if (best === null) return null;
  return { id: best.id, side: best.side, y: best.y };
}

/** The list after the drop. */
export function dropItem(items: readonly StackItem[], id: string, target: DropTarget): StackItem[] {
  const { side } = target;
  return side === 'first' || side === 'last'
    ? moveInto(items, id, target.id, side)
    : moveBeside(items, id, target.id, side);
}
