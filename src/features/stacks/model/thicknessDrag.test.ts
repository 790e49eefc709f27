import { expect, it } from 'vitest';
import { draggedThickness } from './thicknessDrag.ts';

it('is thicker the further down, and comes back to where it began', () => {
  const path = [-40, -10, 0, 3, 10, 40, 120].map((px) => draggedThickness(3, px, 0));
  expect([...path].sort((a, b) => a - b)).toEqual(path);
  expect(draggedThickness(3.137, 0, 0)).toBe(3.137);
});

it('moves in numbers that a person would type', () => {
  for (const px of [1, 7, 23, 61]) {
    for (const start of [0.8, 3, 42, 350]) {
      // At most four significant digits: 351.5 is one, 351.4837 is none.
      const nm = draggedThickness(start, px, 0);
      expect(Number(nm.toPrecision(4))).toBe(nm);
    }
  }
});

it('leaves 0 nm and reaches it again, and stops at what the oxide takes', () => {
  expect(draggedThickness(0, 10, 0)).toBeGreaterThan(0);
  expect(draggedThickness(1, -400, 0)).toBe(0);
  expect(draggedThickness(5, -400, 1.2)).toBe(1.2);
});
