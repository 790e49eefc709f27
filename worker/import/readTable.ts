import { LIMITS } from '../../shared/limits.ts';
import type { ImportTable, ImportWarning } from '../../shared/materialImport.ts';
import { describeBadCell, cellNumber } from './cellNumber.ts';
import { contentLines } from './contentLines.ts';
import type { ContentLine } from './contentLines.ts';
import { decodeText } from './decodeText.ts';
import { detectFormat } from './detectFormat.ts';
import type { TableFormat } from './detectFormat.ts';
import { findHeader } from './findHeader.ts';
import type { Header } from './findHeader.ts';
import { formatWarnings } from './formatWarnings.ts';
import { ImportRefusal } from './importRefusal.ts';
import { refuseForeignFile, refuseForeignText } from './refuseForeignFile.ts';
import { splitCells } from './splitCells.ts';
import { suggestMapping } from './suggestMapping.ts';
import { describeLines, firstLines } from './warningLines.ts';

/** A table as numbers. */
export type ReadTable = {
  table: ImportTable;
  /** One per column of `table`; NaN where the cell is empty. */
  columns: Float64Array[];
  /** Line of each row in the file, 1-based. */
  lines: Int32Array;
};

const ROWS_BETWEEN_REPORTS = 2_000;
/** Rows that are shown as they were read. */
const FIRST_ROWS = 12;
const LAST_ROWS = 3;
const COMMENTS = 20;
const COMMENT_LENGTH = 200;

/**
 * Reads a table of numbers: any of the usual delimiters, decimal signs, encodings and line ends; with or without a
 * header; comment lines anywhere. What is left out stands in the warnings.
 *
 * @param onProgress is called with a fraction that rises to 1
 * @throws ImportRefusal when it is no table or a cell cannot be used; nothing is guessed or repaired
 */
export function readTable(bytes: Uint8Array, onProgress?: (fraction: number) => void): ReadTable {
  refuseForeignFile(bytes);
  const text = decodeText(bytes);
  refuseForeignText(text);
  const lines = contentLines(text);
  const format = detectFormat(lines.content);
  const { header, firstRow, skipped } = findHeader(lines, format);
  const rows = lines.content.slice(firstRow);
  if (rows.length > LIMITS.importRows) {
    throw new ImportRefusal(
      `The table has ${rows.length} rows, the limit is ${LIMITS.importRows}: keep every second one, or cut it in two.`,
    );
  }
  const read = readRows(rows, format, header, onProgress);
  const warnings = [
    ...skippedWarnings(skipped),
    ...formatWarnings(rows, format, header),
    ...emptyWarnings(read),
  ];
  const kept = read.columns.map((_, column) => column).filter((column) => read.filled[column]! > 0);
  const columns = kept.map((column) => read.columns[column]!);
  if (columns.length < 2) {
    throw new ImportRefusal(
      'Only one column has numbers. A table needs a column of wavelengths or energies and at least one of constants.',
    );
  }
  const headers = kept.map((column) => header?.cells[column] || null);
  onProgress?.(1);
  return {
    table: {
      ...format,
      headerLine: header?.line ?? null,
      comments: lines.comments
        .slice(0, COMMENTS)
        .map((comment) => comment.text.trim().slice(0, COMMENT_LENGTH)),
      columns: columns.map((column, i) => ({ header: headers[i]!, ...extremes(column) })),
      rowCount: rows.length,
      firstRows: shownRows(columns, read.lines, 0, FIRST_ROWS),
      lastRows: shownRows(columns, read.lines, Math.max(FIRST_ROWS, rows.length - LAST_ROWS), rows.length),
      suggestion: suggestMapping(headers, columns),
      warnings,
    },
    columns,
    lines: read.lines,
  };
}

type Rows = { columns: Float64Array[]; filled: number[]; lines: Int32Array; header: Header | null };

function readRows(
  rows: ContentLine[],
  { delimiter, decimal }: TableFormat,
  header: Header | null,
  onProgress: ((fraction: number) => void) | undefined,
): Rows {
  const width = header ? header.cells.length : splitCells(rows[0]!, delimiter).length;
  if (width > LIMITS.importColumns) {
    throw new ImportRefusal(
      `The table has ${width} columns, the limit is ${LIMITS.importColumns}: keep only the columns that are needed.`,
    );
  }
  const columns = Array.from({ length: width }, () => new Float64Array(rows.length));
  const filled = new Array<number>(width).fill(0);
  for (const [position, row] of rows.entries()) {
    if (position % ROWS_BETWEEN_REPORTS === 0) onProgress?.(position / rows.length);
    const cells = splitCells(row, delimiter);
    if (isRagged(cells, width)) throw ragged(row.line, cells, width, header, rows[0]!.line);
    for (let column = 0; column < width; column += 1) {
      const value = cellNumber(cells[column]!, decimal);
      if (value === null || value === Infinity || value === -Infinity) {
        throw badCell(row, column, cells[column]!, decimal, header);
      }
      columns[column]![position] = value;
      if (!Number.isNaN(value)) filled[column]! += 1;
    }
  }
  return { columns, filled, lines: Int32Array.from(rows, ({ line }) => line), header };
}

/** Empty cells behind the last column are trailing delimiters. */
function isRagged(cells: string[], width: number): boolean {
  if (cells.length < width) return true;
  for (let i = width; i < cells.length; i += 1) if (cells[i] !== '') return true;
  return false;
}

function ragged(line: number, cells: string[], width: number, header: Header | null, first: number) {
  const other = header ? `the header (line ${header.line})` : `the first row (line ${first})`;
  return new ImportRefusal(
    `Line ${line} has ${cells.length} cells, ${other} has ${width}. Every row needs the same columns: leave a cell ` +
      'empty where a value is missing, and separate the columns by semicolons where commas are decimal signs.',
  );
}

function badCell(
  row: ContentLine,
  column: number,
  cell: string,
  decimal: TableFormat['decimal'],
  header: Header | null,
): ImportRefusal {
  const name = header?.cells[column];
  const where = `Line ${row.line}, column ${column + 1}${name ? ` (${name})` : ''}`;
  return new ImportRefusal(`${where}: ${describeBadCell(cell, decimal)}.`);
}

function skippedWarnings(skipped: number[]): ImportWarning[] {
  if (skipped.length === 0) return [];
  return [
    {
      code: 'skipped-lines',
      message: `Left out before the table, as neither comment nor header: ${describeLines(skipped)}.`,
      lines: firstLines(skipped),
    },
  ];
}

function emptyWarnings({ columns, filled, lines, header }: Rows): ImportWarning[] {
  return columns.flatMap((column, position): ImportWarning[] => {
    const name = header?.cells[position] || `column ${position + 1}`;
    const empty = column.length - filled[position]!;
    if (empty === 0) return [];
    if (filled[position] === 0) {
      // A last column without a name is what a delimiter at the end of every line makes.
      if (!header?.cells[position] && position === columns.length - 1) return [];
      return [{ code: 'empty-cells', message: `${name} has no numbers at all and was left out.`, lines: [] }];
    }
    const where = Array.from(lines).filter((_, row) => Number.isNaN(column[row]));
    return [
      {
        code: 'empty-cells',
        message: `${name} has no number in ${empty} of ${column.length} rows (${describeLines(where)}).`,
        lines: firstLines(where),
      },
    ];
  });
}

function extremes(column: Float64Array): { least: number; greatest: number } {
  let least = Infinity;
  let greatest = -Infinity;
  for (const value of column) {
    if (value < least) least = value;
    if (value > greatest) greatest = value;
  }
  return { least, greatest };
}

function shownRows(columns: Float64Array[], lines: Int32Array, from: number, to: number) {
  return Array.from(lines.slice(from, to), (line, i) => ({
    line,
    cells: columns.map((column) => {
      const value = column[from + i]!;
      return Number.isNaN(value) ? null : value;
    }),
  }));
}
