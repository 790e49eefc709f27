import { describe, expect, it } from 'vitest';
import type { StudyRow } from './rows.ts';
import { itemsOf, moveByOne, moveTo, setRemoved } from './rows.ts';

function build(...ids: string[]): StudyRow[] {
  return ids.map((id) => ({ item: { kind: 'note', id, text: id }, removed: false }));
}

const order = (rows: readonly StudyRow[]) => rows.map(({ item }) => item.id).join('');

describe('ordering the items of a study', () => {
  it('moves by one place, and not past the ends', () => {
    expect(order(moveByOne(build('a', 'b', 'c'), 'b', -1))).toBe('bac');
    expect(order(moveByOne(build('a', 'b', 'c'), 'b', 1))).toBe('acb');
    expect(order(moveByOne(build('a', 'b', 'c'), 'a', -1))).toBe('abc');
    expect(order(moveByOne(build('a', 'b', 'c'), 'c', 1))).toBe('abc');
  });

  it('steps over what is removed, which nobody sees in the order', () => {
    const rows = setRemoved(build('a', 'b', 'c'), 'b', true);
    expect(itemsOf(moveByOne(rows, 'a', 1)).map(({ id }) => id)).toEqual(['c', 'a']);
    expect(itemsOf(moveByOne(rows, 'c', -1)).map(({ id }) => id)).toEqual(['c', 'a']);
  });

  it('puts an item before a row as they stand before the move', () => {
    expect(order(moveTo(build('a', 'b', 'c'), 'a', 3))).toBe('bca');
    expect(order(moveTo(build('a', 'b', 'c'), 'c', 0))).toBe('cab');
    expect(order(moveTo(build('a', 'b', 'c'), 'b', 1))).toBe('abc');
    expect(order(moveTo(build('a', 'b', 'c'), 'b', 2))).toBe('abc');
  });

  it('keeps a removed item in its place until it is saved, and gives it back', () => {
    const removed = setRemoved(build('a', 'b', 'c'), 'b', true);
    expect(itemsOf(removed).map(({ id }) => id)).toEqual(['a', 'c']);
    expect(order(setRemoved(removed, 'b', false))).toBe('abc');
    expect(itemsOf(setRemoved(removed, 'b', false))).toHaveLength(3);
  });
});
