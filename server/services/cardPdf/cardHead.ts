import type { SharedGrowthCard } from '../../../shared/growthCard.ts';
import type { Pen } from './pen.ts';
import { drawQrCode } from './qrCode.ts';

/** Side of the QR code: 24 mm, read by a phone at arm's length. */
const CODE_SIDE = 68;
const TITLE_SIZE = 17;
const LINE_SIZE = 9;
const ADDRESS_SIZE = 6.5;

/** Title, sample id and date lines to write on, and the code of the link with its address. */
export class CardHead {
  readonly #card: SharedGrowthCard;

  constructor(card: SharedGrowthCard) {
    this.#card = card;
  }

  height(pen: Pen, width: number): number {
    const title = this.#titleLines(pen, width).length * pen.lineHeight(TITLE_SIZE);
    const text = title + (this.#addressLines(pen, width).length + 1) * pen.lineHeight(ADDRESS_SIZE) + 34;
    return Math.max(text, this.#card.url === null ? 0 : CODE_SIDE + 6);
  }

  draw(pen: Pen, x: number, y: number, width: number): void {
    const { url, sampleId } = this.#card;
    const textWidth = this.#textWidth(width);
    pen.line('Growth card', { x, y, width: textWidth, size: ADDRESS_SIZE });
    let top = y + pen.lineHeight(ADDRESS_SIZE);
    for (const line of this.#titleLines(pen, width)) {
      pen.line(line, { x, y: top, width: textWidth, size: TITLE_SIZE });
      top += pen.lineHeight(TITLE_SIZE);
    }
    top += 6;
    this.#field(pen, 'Sample id', sampleId, { x, y: top, width: 0.5 * textWidth });
    this.#field(pen, 'Grown on', '', { x: x + 0.52 * textWidth, y: top, width: 0.22 * textWidth });
    this.#field(pen, 'by', '', { x: x + 0.76 * textWidth, y: top, width: 0.24 * textWidth });
    top += 22;
    for (const line of this.#addressLines(pen, width)) {
      pen.line(line, { x, y: top, width: textWidth, size: ADDRESS_SIZE });
      top += pen.lineHeight(ADDRESS_SIZE);
    }
    if (url !== null) drawQrCode(pen.doc, url, x + width - CODE_SIDE, y, CODE_SIDE);
  }

  /** The height of what stands above the second and further pages. */
  continuedHeight(pen: Pen): number {
    return pen.lineHeight(LINE_SIZE) + 12;
  }

  drawContinued(pen: Pen, x: number, y: number, width: number): void {
    const { title, sampleId } = this.#card;
    const [line = ''] = pen.wrap(title, LINE_SIZE, 0.62 * width);
    pen.line(line === title ? title : `${line} ...`, { x, y, width, size: LINE_SIZE });
    this.#field(pen, 'Sample id', sampleId, { x: x + 0.7 * width, y, width: 0.3 * width });
  }

  /** A line to write on, with what is known already. */
  #field(pen: Pen, label: string, value: string, at: { x: number; y: number; width: number }): void {
    const labelWidth = pen.widthOf(label, LINE_SIZE) + 5;
    pen.line(label, { ...at, size: LINE_SIZE });
    pen.rule(at.x + labelWidth, at.y + pen.lineHeight(LINE_SIZE), at.width - labelWidth);
    pen.line(value, { x: at.x + labelWidth + 2, y: at.y, width: at.width, size: LINE_SIZE });
  }

  #textWidth(width: number): number {
    return this.#card.url === null ? width : width - CODE_SIDE - 16;
  }

  #titleLines(pen: Pen, width: number): string[] {
    return pen.wrap(this.#card.title, TITLE_SIZE, this.#textWidth(width));
  }

  #addressLines(pen: Pen, width: number): string[] {
    const { url } = this.#card;
    return url === null ? [] : pen.wrap(`The code opens ${url}`, ADDRESS_SIZE, this.#textWidth(width));
  }
}
