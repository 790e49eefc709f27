import type { Issue } from '../../../../shared/error.ts';
import { parseNumber } from '../../../lib/parseNumber.ts';

/** Where the API finds the cell of a row and column: wavelength, then the two values. */
type CellPath = (row: number, column: number) => string;

export function indexCellPath(path: string): CellPath {
  return (row, column) => `${path}.${['wavelengthsNm', 'n', 'k'][column]}[${row}]`;
}

export const voigtCellPath: CellPath = (row, column) =>
  column === 0 ? `voigt.wavelengthsNm[${row}]` : `voigt.q[${row}][${column - 1}]`;

const isBlank = (row: readonly string[]) => row.every((cell) => cell.trim() === '');

/** Rows without the empty ones at the end, which only wait for the next value. */
export function usedRows(rows: readonly string[][]): readonly string[][] {
  return rows.slice(0, rows.findLastIndex((row) => !isBlank(row)) + 1);
}

/** The three columns as numbers, NaN with an issue where a cell holds none. */
export function readCells(
  rows: readonly string[][],
  pathOf: CellPath,
  issues: Issue[],
): [number[], number[], number[]] {
  const read = (column: number) =>
    usedRows(rows).map((row, position) => {
      const text = row[column] ?? '';
      const value = parseNumber(text);
      if (value !== null) return value;
      const message = text.trim() === '' ? 'must be filled in' : `must be a number, got "${text.trim()}"`;
      issues.push({ path: pathOf(position, column), message });
      return NaN;
    });
  return [read(0), read(1), read(2)];
}

/**
 * Cells of a spreadsheet or a text file as rows of three, null for a single value, which belongs into one cell.
 * A header line, which has no number, is left out; an absent last column becomes 0.
 */
export function rowsOfPaste(text: string): string[][] | null {
  const lines = text.split(/\r\n?|\n/).filter((line) => line.trim() !== '');
  const rows = lines.map(splitLine).filter((cells) => cells.some((cell) => parseNumber(cell) !== null));
  const [first] = rows;
  if (!first || (rows.length === 1 && first.length === 1)) return null;
  return rows.map(([wavelength = '', second = '', third = '0']) => [wavelength, second, third]);
}

/** By tabs or semicolons where there are any, else by commas unless they are decimal, else by spaces. */
function splitLine(line: string): string[] {
  const delimiter = /[\t;]/.test(line) ? /[\t;]/ : /,\s|\.\d*\s*,|,.*,/.test(line) ? ',' : /\s+/;
  return line
    .trim()
    .split(delimiter)
    .map((cell) => cell.trim());
}

/** Ascending by the first column; rows without a wavelength go to the end. */
export function sortedRows(rows: readonly string[][]): string[][] {
  const key = ([cell = '']: string[]) => parseNumber(cell) ?? Infinity;
  return [...rows].sort((a, b) => (key(a) === key(b) ? 0 : key(a) - key(b)));
}

/** Whether the wavelengths that can be read rise from row to row. */
export function isAscending(rows: readonly string[][]): boolean {
  const wavelengths = usedRows(rows).flatMap(([cell = '']) => parseNumber(cell) ?? []);
  return wavelengths.every((value, row) => row === 0 || value > (wavelengths[row - 1] ?? -Infinity));
}
