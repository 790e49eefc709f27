import type { Align, Pen } from './pen.ts';

/** A piece of the page that is never cut: measured first, then drawn where there is room. Lengths in points. */
export type Block = {
  height(pen: Pen, width: number): number;
  draw(pen: Pen, x: number, y: number, width: number): void;
  /** A heading stays with what follows it. */
  keepsWithNext?: boolean;
  /** Titles of the columns, which stand once more above it where it begins a page. */
  head?: Block;
};

/** @param options.size of the type; `before` is the space above */
export function paragraph(
  text: string,
  options: { size: number; before?: number; indent?: number; keepsWithNext?: boolean; head?: Block },
): Block {
  const { size, before = 0, indent = 0, keepsWithNext = false, head } = options;
  return {
    keepsWithNext,
    ...(head && { head }),
    height: (pen, width) =>
      before * pen.scale + pen.wrap(text, size, width - indent).length * pen.lineHeight(size),
    draw(pen, x, y, width) {
      pen.wrap(text, size, width - indent).forEach((line, position) => {
        const top = y + before * pen.scale + position * pen.lineHeight(size);
        pen.line(line, { x: x + indent, y: top, width: width - indent, size });
      });
    },
  };
}

/** A title over a rule. */
export function heading(text: string): Block {
  const size = 9.5;
  const before = 9;
  return {
    keepsWithNext: true,
    height: (pen) => (before + 3) * pen.scale + pen.lineHeight(size),
    draw(pen, x, y, width) {
      pen.line(text, { x, y: y + before * pen.scale, width, size });
      pen.rule(x, y + (before + 1) * pen.scale + pen.lineHeight(size), width, 0.8);
    },
  };
}

export type Column = {
  title: string;
  /** Share of the width of the table. */
  share: number;
  align?: Align;
  /** A cell to write into: framed, also where something is printed in it. */
  byHand?: boolean;
};

const CELL_SIZE = 8.5;
const CELL_PADDING = 3;

/** Titles of the columns. */
export function tableHead(columns: Column[]): Block {
  return tableRow(
    columns,
    columns.map(({ title }) => title),
    { isHead: true },
  );
}

/** @param cells as many as there are columns */
export function tableRow(
  columns: Column[],
  cells: string[],
  options: { isHead?: boolean; isRepeated?: boolean; keepsWithNext?: boolean; head?: Block } = {},
): Block {
  const { isHead = false, isRepeated = false, keepsWithNext = isHead, head } = options;
  const size = isHead ? 7 : CELL_SIZE;
  const linesOf = (pen: Pen, width: number) =>
    columns.map(({ share }, at) => pen.wrap(cells[at] ?? '', size, share * width - 2 * CELL_PADDING));
  const height = (pen: Pen, width: number) => {
    const most = Math.max(1, ...linesOf(pen, width).map((lines) => lines.length));
    return most * pen.lineHeight(size) + (isHead ? 3 : 5) * pen.scale;
  };
  return {
    keepsWithNext,
    ...(head && { head }),
    height,
    draw(pen, x, y, width) {
      const bottom = y + height(pen, width);
      let left = x;
      linesOf(pen, width).forEach((lines, at) => {
        const { share, align, byHand = false } = columns[at]!;
        const cell = share * width;
        lines.forEach((line, position) => {
          const top = y + (isHead ? 1 : 2.5) * pen.scale + position * pen.lineHeight(size);
          const inner = { x: left + CELL_PADDING, width: cell - 2 * CELL_PADDING };
          pen.line(line, { ...inner, y: top, size, align });
        });
        if (byHand && !isHead) {
          pen.doc
            .rect(left, y, cell, bottom - y)
            .lineWidth(0.4)
            .strokeColor('black')
            .stroke();
        }
        left += cell;
      });
      pen.rule(x, bottom, width, isHead ? 0.8 : 0.3);
      // The bar of a block runs through all of its rows.
      if (isRepeated)
        pen.doc
          .rect(x - 5, y, 2, bottom - y)
          .fillColor('black')
          .fill();
    },
  };
}
