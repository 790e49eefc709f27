import type { PlotFrame, PlotMark } from './plotTypes.ts';

/** Width of a letter of a mark's name, px, on the generous side: names are not measured. */
const LETTER_PX = 6.2;
/** Room between the names of two marks, px. */
const GAP_PX = 6;
const ROW_PX = 20;

type MarkPlace = PlotMark & { px: number; y: number; anchor: 'start' | 'middle' | 'end' };

/**
 * Where the names of marks stand: above the plot, inwards at its ends, and one row further down where a name would run into
 * the one before.
 *
 * @param toPx from x to pixels
 */
export function markPlaces(
  marks: readonly PlotMark[],
  toPx: (x: number) => number,
  frame: PlotFrame,
): MarkPlace[] {
  let end = -Infinity;
  return marks
    .map((mark) => ({ ...mark, px: toPx(mark.x) }))
    .sort((a, b) => a.px - b.px)
    .map((mark) => {
      const { px, label } = mark;
      const width = LETTER_PX * label.length;
      const anchor = px - width / 2 < frame.left ? 'start' : px + width / 2 > frame.right ? 'end' : 'middle';
      const left = anchor === 'start' ? px : anchor === 'end' ? px - width : px - width / 2;
      const isLower = left < end + GAP_PX;
      end = isLower ? -Infinity : left + width;
      return { ...mark, anchor, y: frame.top - 9 + (isLower ? ROW_PX : 0) };
    });
}
