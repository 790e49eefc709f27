import { describe, expect, it } from 'vitest';
import { dropItem, dropTarget } from './dropTarget.ts';
import type { DropRow } from './dropTarget.ts';
import { isBlock } from './items.ts';
import { buildBlock, buildLayer } from './stackFixtures.ts';

/** a, then a block of b between its head and foot, as they lie on the screen. */
const rows: DropRow[] = [
  { id: 'a', kind: 'layer', top: 0, bottom: 40 },
  { id: 'block', kind: 'head', top: 40, bottom: 76 },
  { id: 'b', kind: 'layer', top: 76, bottom: 116 },
  { id: 'block', kind: 'foot', top: 116, bottom: 126 },
];

describe('dropTarget', () => {
  it.each([
    [-20, { id: 'a', side: 'above' }],
    [12, { id: 'a', side: 'above' }],
    [70, { id: 'block', side: 'first' }],
    [112, { id: 'b', side: 'below' }],
    [124, { id: 'block', side: 'below' }],
    [500, { id: 'block', side: 'below' }],
  ])('at %s px', (y, target) => {
    expect(dropTarget(rows, y)).toMatchObject(target);
  });

  it('is nothing on an empty drawing', () => {
    expect(dropTarget([], 10)).toBeNull();
  });
});

describe('dropItem', () => {
  it('puts a layer first into a block', () => {
    const items = [buildLayer({ id: 'a' }), buildBlock([buildLayer({ id: 'b' })])];
    const [block, ...rest] = dropItem(items, 'a', { id: 'block', side: 'first', y: 0 });
    expect(rest).toEqual([]);
    expect(block && isBlock(block) && block.layers.map(({ id }) => id)).toEqual(['a', 'b']);
  });
});
