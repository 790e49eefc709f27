import type { Block } from './blocks.ts';
import type { Pen } from './pen.ts';

/** Between two columns of blocks, points. */
const GAP = 16;

/** Two groups of blocks in columns of half the width, never cut. */
export function beside(left: Block[], right: Block[]): Block {
  const half = (width: number) => (width - GAP) / 2;
  const heightOf = (group: Block[], pen: Pen, width: number) =>
    group.reduce((sum, block) => sum + block.height(pen, width), 0);
  const drawGroup = (group: Block[], pen: Pen, x: number, y: number, width: number) => {
    let top = y;
    for (const block of group) {
      block.draw(pen, x, top, width);
      top += block.height(pen, width);
    }
  };
  return {
    height: (pen, width) => Math.max(heightOf(left, pen, half(width)), heightOf(right, pen, half(width))),
    draw(pen, x, y, width) {
      drawGroup(left, pen, x, y, half(width));
      drawGroup(right, pen, x + half(width) + GAP, y, half(width));
    },
  };
}
