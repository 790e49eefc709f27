import PDFDocument from 'pdfkit';
import type { SharedGrowthCard } from '../../../shared/growthCard.ts';
import type { Block } from './blocks.ts';
import { cardBlocks } from './cardBlocks.ts';
import { CardHead } from './cardHead.ts';
import { Pen } from './pen.ts';

/** A4 in points, and the margin that printers leave. */
const PAGE = { width: 595.28, height: 841.89, margin: 36 };
const FOOTER = 16;

/** Sizes that are tried in turn for the fewest pages; in the last, rows are as low as a hand can write in. */
const SCALES = [1, 0.95, 0.9, 0.85, 0.8, 0.75, 0.7];
/** From this size down, what is short stands beside or behind another. */
const TIGHT_SCALE = 0.9;

type Placed = { block: Block; y: number };

/**
 * The card on one A4 page, black on white. A film of many layers gets smaller type; what does not fit then goes on to
 * further pages, under the title and the columns once more: nothing is cut off.
 */
export async function growthCardPdf(card: SharedGrowthCard): Promise<Buffer> {
  const doc = new PDFDocument({
    autoFirstPage: false,
    // Without this the library loads a font of its own that is never used.
    font: '',
    info: { Title: card.title, Creator: 'Skewlight', CreationDate: new Date(card.createdAt) },
    lang: 'en',
  });
  const bytes = collect(doc);
  const head = new CardHead(card);
  const { pen, pages } = layOut(doc, head, card);
  pages.forEach((placed, at) => {
    doc.addPage({ size: 'A4', margin: 0 });
    if (at === 0) head.draw(pen, PAGE.margin, PAGE.margin, textWidth);
    else head.drawContinued(pen, PAGE.margin, PAGE.margin, textWidth);
    for (const { block, y } of placed) block.draw(pen, PAGE.margin, y, textWidth);
    if (pages.length > 1) drawFooter(pen, card.title, at + 1, pages.length);
  });
  doc.end();
  return bytes;
}

const textWidth = PAGE.width - 2 * PAGE.margin;
const bottom = PAGE.height - PAGE.margin;

type LaidOut = { pen: Pen; pages: Placed[][] };

/** In the largest size that takes the fewest pages. */
function layOut(doc: PDFKit.PDFDocument, head: CardHead, card: SharedGrowthCard): LaidOut {
  const widths = new Map<string, number>();
  let best: LaidOut | null = null;
  for (const scale of SCALES) {
    const pen = new Pen(doc, scale, widths);
    const blocks = cardBlocks(card, scale <= TIGHT_SCALE);
    const onOne = flow(pen, head, blocks, bottom);
    if (onOne.length === 1) return { pen, pages: onOne };
    const pages = flow(pen, head, blocks, bottom - FOOTER);
    if (!best || pages.length < best.pages.length) best = { pen, pages };
  }
  return best!;
}

/** Blocks from the top down, on to the next page where one does not fit; a heading goes with what follows it. */
function flow(pen: Pen, head: CardHead, blocks: Block[], end: number): Placed[][] {
  const pages: Placed[][] = [[]];
  let y = PAGE.margin + head.height(pen, textWidth);
  const place = (block: Block) => {
    pages.at(-1)!.push({ block, y });
    y += block.height(pen, textWidth);
  };
  for (const [at, block] of blocks.entries()) {
    const needed = block.height(pen, textWidth) + heightThatFollows(pen, blocks, at);
    if (y + needed > end && pages.at(-1)!.length > 0) {
      pages.push([]);
      y = PAGE.margin + head.continuedHeight(pen);
      if (block.head) place(block.head);
    }
    place(block);
  }
  return pages;
}

function heightThatFollows(pen: Pen, blocks: Block[], at: number): number {
  let height = 0;
  for (let here = at; blocks[here]?.keepsWithNext && blocks[here + 1]; here += 1) {
    height += blocks[here + 1]!.height(pen, textWidth);
  }
  return height;
}

function drawFooter(pen: Pen, title: string, page: number, of: number): void {
  const more = page < of ? ', continued overleaf' : '';
  const text = `${title}: page ${page} of ${of}${more}`;
  pen.line(text, { x: PAGE.margin, y: bottom - FOOTER + 6, width: textWidth, size: 7.5, align: 'right' });
}

function collect(doc: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const pieces: Uint8Array[] = [];
    doc.on('data', (piece: Uint8Array) => pieces.push(piece));
    doc.on('end', () => resolve(Buffer.concat(pieces)));
    doc.on('error', reject);
  });
}
