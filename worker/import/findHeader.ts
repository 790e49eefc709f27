import { cellNumber } from './cellNumber.ts';
import type { ContentLine, ContentLines } from './contentLines.ts';
import { isRow } from './detectFormat.ts';
import type { TableFormat } from './detectFormat.ts';
import { recogniseHeader } from './recogniseHeader.ts';
import { splitCells } from './splitCells.ts';

export type Header = { line: number; cells: string[] };

export type Beginning = {
  header: Header | null;
  /** Position of the first row among the content lines. */
  firstRow: number;
  /** Lines before the rows that are neither comment nor header. */
  skipped: number[];
};

/** Cells of a line that gives the units below the names. */
const unitCell =
  /^[[(]?(?:-*|nm|[uµμ]m|microns?|a|å|angstroms?|ev|(?:1\/cm|cm\^?-1|cm⁻¹)|thz|s\^?-1|1\/s|s\/m|m?deg|m?rad|arcmin|°|1)[\])]?$/i;

/**
 * Finds where the rows begin and which line names the columns: the last one before them with as many cells, with the
 * units that may stand on a line of their own below; else the last comment before them, when it names known quantities.
 */
export function findHeader({ content, comments }: ContentLines, format: TableFormat): Beginning {
  const firstRow = content.findIndex((line) => isRow(line, format) || startsAsRow(line, format));
  const width = widthOf(content.slice(firstRow, firstRow + 50), format);
  const before = content.slice(0, firstRow);
  const candidates = before.map((line) => ({ line: line.line, cells: headerCells(line, format, width) }));
  let last = candidates.at(-1);
  let used = last ? 1 : 0;
  const above = candidates.at(-2);
  if (
    last &&
    above &&
    above.cells.length >= Math.max(2, last.cells.length) &&
    last.cells.every((cell) => unitCell.test(cell))
  ) {
    const units = last.cells.map((cell) => cell.replace(/^[[(]|[\])]$/g, '').replace(/^-+$/, ''));
    last = {
      line: above.line,
      cells: above.cells.map((cell, i) => (units[i] ? `${cell} (${units[i]})` : cell)),
    };
    used = 2;
  }
  if (last && last.cells.length < 2) {
    last = undefined;
    used = 0;
  }
  const skipped = before.slice(0, before.length - used).map(({ line }) => line);
  return { header: last ?? commentedHeader(comments, content[firstRow], format, width), firstRow, skipped };
}

function commentedHeader(
  comments: ContentLine[],
  row: ContentLine | undefined,
  format: TableFormat,
  width: number,
): Header | null {
  const comment = comments.findLast(({ line }) => row !== undefined && line < row.line);
  if (!comment) return null;
  const cells = headerCells(comment, format, width);
  const known = cells.filter((cell) => recogniseHeader(cell) !== null).length;
  return cells.length === width && known >= 2 ? { line: comment.line, cells } : null;
}

/** Names may have spaces in them where spaces separate the columns. */
function headerCells(line: ContentLine, { delimiter }: TableFormat, width: number): string[] {
  const cells = splitHeader(line, delimiter);
  if (delimiter !== 'space' || cells.length === width) return cells;
  const wide = line.text.trim().split(/\s{2,}|\t+/);
  if (wide.length === width) return wide;
  const joined = line.text
    .replace(/\s+([[(])/g, '$1')
    .trim()
    .split(/\s+/);
  return joined.length === width ? joined : [];
}

function splitHeader(line: ContentLine, delimiter: TableFormat['delimiter']): string[] {
  const cells = splitCells(line, delimiter);
  while (cells.at(-1) === '') cells.pop();
  return cells;
}

/** A row whose other cells are not numbers must be refused as a row, not skipped as words before the table. */
function startsAsRow(line: ContentLine, { delimiter, decimal }: TableFormat): boolean {
  if (delimiter === 'space') return false;
  const [first = '', ...others] = splitCells(line, delimiter);
  return first !== '' && cellNumber(first, decimal) !== null && others.length > 0;
}

/** The commonest number of cells. */
function widthOf(rows: ContentLine[], { delimiter }: TableFormat): number {
  const counts = new Map<number, number>();
  for (const row of rows) {
    const { length } = splitCells(row, delimiter);
    counts.set(length, (counts.get(length) ?? 0) + 1);
  }
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? 0;
}
