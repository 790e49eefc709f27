import PDFDocument from 'pdfkit';
import type { SharedGrowthCard } from '../../../shared/growthCard.ts';
import type { Block } from './blocks.ts';
import { cardBlocks } from './cardBlocks.ts';
import { CardHead } from './cardHead.ts';
import { Pen } from './pen.ts';

/** A4 in points, and the margin that printers leave. */
const PAGE = { width: 595.28, height: 841.89, margin: 36 };
const FOOTER = 16;

/** Sizes that are tried in turn until the card fits on one page; the last is as small as paper can be read. */
const SCALES = [1, 0.95, 0.9, 0.85, 0.8, 0.75];

type Placed = { block: Block; y: number };

/**
 * The card on one A4 page, black on white. A film of many layers gets smaller type; what does not fit then goes on to
 * further pages, with a note: nothing is cut off.
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
  const blocks = cardBlocks(card);
  const { pen, pages } = layOut(doc, head, blocks);
  pages.forEach((placed, at) => {
    doc.addPage({ size: 'A4', margin: 0 });
    if (at === 0) head.draw(pen, PAGE.margin, PAGE.margin, textWidth);
    for (const { block, y } of placed) block.draw(pen, PAGE.margin, y, textWidth);
    if (pages.length > 1) drawFooter(pen, card.title, at + 1, pages.length);
  });
  doc.end();
  return bytes;
}

const textWidth = PAGE.width - 2 * PAGE.margin;
const bottom = PAGE.height - PAGE.margin;

function layOut(doc: PDFKit.PDFDocument, head: CardHead, blocks: Block[]): { pen: Pen; pages: Placed[][] } {
  const widths = new Map<string, number>();
  for (const scale of SCALES) {
    const pen = new Pen(doc, scale, widths);
    const pages = flow(pen, head.height(pen, textWidth), blocks, bottom);
    if (pages.length === 1) return { pen, pages };
  }
  const pen = new Pen(doc, 0.85, widths);
  return { pen, pages: flow(pen, head.height(pen, textWidth), blocks, bottom - FOOTER) };
}

/** Blocks from the top down, on to the next page where one does not fit; a heading goes with what follows it. */
function flow(pen: Pen, headHeight: number, blocks: Block[], end: number): Placed[][] {
  const pages: Placed[][] = [[]];
  let y = PAGE.margin + headHeight;
  for (const [at, block] of blocks.entries()) {
    const height = block.height(pen, textWidth);
    if (y + height + heightThatFollows(pen, blocks, at) > end && pages.at(-1)!.length > 0) {
      pages.push([]);
      y = PAGE.margin;
    }
    pages.at(-1)!.push({ block, y });
    y += height;
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
