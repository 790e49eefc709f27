import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { StackItem } from '../../../../shared/stack.ts';
import { countLayers } from '../../../../shared/stackCase.ts';
import {
  copyItem,
  insertBeside,
  isBlock,
  listLayers,
  moveBeside,
  moveInto,
  moveStep,
  removeItem,
  unwrapBlock,
  withLayer,
  wrapInBlock,
} from './items.ts';
import { buildBlock, buildDocument, buildLayer } from './stackFixtures.ts';

/** The order as text: `a [b c] d`. */
function order(items: readonly StackItem[] | null): string {
  return (items ?? []).map((item) => (isBlock(item) ? `[${order(item.layers)}]` : item.id)).join(' ');
}

const film = () => [
  buildLayer({ id: 'a' }),
  buildBlock([buildLayer({ id: 'b' }), buildLayer({ id: 'c' })]),
  buildLayer({ id: 'd' }),
];

describe('edits of the layer tree', () => {
  it('inserts beside an item inside a block too', () => {
    const added = buildLayer({ id: 'new' });
    expect(order(insertBeside(film(), 'c', 'above', added))).toBe('a [b new c] d');
    expect(order(insertBeside(film(), 'block', 'below', added))).toBe('a [b c] new d');
  });

  it('removes, wraps and unwraps', () => {
    expect(order(removeItem(film(), 'b'))).toBe('a [c] d');
    expect(order(wrapInBlock(film(), 'a', 'wrap'))).toBe('[a] [b c] d');
    expect(order(unwrapBlock(film(), 'block'))).toBe('a b c d');
  });

  it('moves in and out of blocks by steps, and stops at the ends', () => {
    expect(order(moveStep(film(), 'a', 'down'))).toBe('[a b c] d');
    expect(order(moveStep(film(), 'd', 'up'))).toBe('a [b c d]');
    expect(order(moveStep(film(), 'b', 'up'))).toBe('a b [c] d');
    expect(order(moveStep(film(), 'c', 'down'))).toBe('a [b] c d');
    expect(order(moveStep(film(), 'block', 'down'))).toBe('a d [b c]');
    expect(moveStep(film(), 'a', 'up')).toBeNull();
    expect(moveStep(film(), 'd', 'down')).toBeNull();
  });

  it('does not move a block into itself', () => {
    expect(order(moveBeside(film(), 'block', 'b', 'above'))).toBe('a [b c] d');
    expect(order(moveInto(film(), 'block', 'block', 'first'))).toBe('a [b c] d');
  });

  it('copies with ids of their own, inside blocks too', () => {
    const block = film()[1]!;
    const copy = copyItem(block);
    expect(copy.id).not.toBe(block.id);
    expect(listLayers([copy]).map(({ id }) => id)).not.toContain('b');
    expect(countLayers([copy])).toBe(countLayers([block]));
  });

  it('keeps what did not change, so that it is not drawn again', () => {
    const document = buildDocument();
    const changed = withLayer(document, 'co', { thicknessNm: 2 });
    expect(changed.layers[0]).toBe(document.layers[0]);
    expect(changed.layers[1]).toMatchObject({ id: 'co', thicknessNm: 2, m: [0, 0, 1] });
    expect(document.layers[1]).toMatchObject({ thicknessNm: 1 });
  });

  it('leaves a key out of the layer when it is cleared: the schema refuses unknown nothing', () => {
    const changed = withLayer(buildDocument(), 'co', { m: undefined, note: '', fixed: false });
    expect(Object.keys(changed.layers[1]!).sort()).toEqual(['id', 'medium', 'thicknessNm']);
  });

  it('neither loses nor doubles an item, whatever is moved where', () => {
    const ids = ['a', 'b', 'c', 'd', 'block'] as const;
    const moves = fc.array(
      fc.tuple(
        fc.constantFrom(...ids),
        fc.constantFrom(...ids),
        fc.constantFrom('above', 'below', 'first', 'up'),
      ),
      { maxLength: 12 },
    );
    fc.assert(
      fc.property(moves, (list) => {
        let items: StackItem[] = film();
        for (const [id, target, how] of list) {
          if (how === 'first') items = moveInto(items, id, target, 'first');
          else if (how === 'up') items = moveStep(items, id, 'up') ?? items;
          else items = moveBeside(items, id, target, how === 'above' ? 'above' : 'below');
        }
        expect(
          listLayers(items)
            .map(({ id }) => id)
            .sort(),
        ).toEqual(['a', 'b', 'c', 'd']);
      }),
      { numRuns: 200 },
    );
  });
});

describe('a layer of a real sample', () => {
  const oxide = { medium: { index: 2.3 }, consumedNm: 1, expansion: 1.7 };
  const film = buildDocument({
    layers: [
      buildLayer({ id: 'co', m: [0, 0, 1], gradedNm: 0.4, dead: { topNm: 0.2, bottomNm: 0.1 }, oxide }),
    ],
  });

  it('keeps its graded interface, dead parts and oxide when a number beside them changes', () => {
    const [layer] = withLayer(film, 'co', { thicknessNm: 5 }).layers;
    expect(layer).toEqual({ ...film.layers[0], thicknessNm: 5 });
  });

  it('loses its dead parts with its magnetization', () => {
    const [layer] = withLayer(film, 'co', { m: undefined }).layers;
    expect(layer).not.toHaveProperty('dead');
    expect(layer).toHaveProperty('oxide', oxide);
  });
});
