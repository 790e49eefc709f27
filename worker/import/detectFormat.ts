import { cellNumber, looksNumeric } from './cellNumber.ts';
import type { Decimal } from './cellNumber.ts';
import type { ContentLine } from './contentLines.ts';
import { ImportRefusal } from './importRefusal.ts';
import { splitCells } from './splitCells.ts';
import type { Delimiter } from './splitCells.ts';

export type TableFormat = { delimiter: Delimiter; decimal: Decimal };

/** Enough to see what separates the cells; the whole file is read strictly afterwards. */
const SAMPLE_LINES = 400;

/** In the order of preference where several read all lines: a table of integers is a comma table with points. */
const candidates: TableFormat[] = [
  { delimiter: 'tab', decimal: 'point' },
  { delimiter: 'semicolon', decimal: 'point' },
  { delimiter: 'comma', decimal: 'point' },
  { delimiter: 'space', decimal: 'point' },
  { delimiter: 'tab', decimal: 'comma' },
  { delimiter: 'semicolon', decimal: 'comma' },
  { delimiter: 'comma', decimal: 'comma' },
  { delimiter: 'space', decimal: 'comma' },
];

/**
 * What separates cells and decimals: the reading under which most lines are rows of numbers in at least two cells.
 *
 * @throws ImportRefusal when no line is such a row
 */
export function detectFormat(content: ContentLine[]): TableFormat {
  const sample = sampleOf(content);
  const scores = candidates.map((format) => sample.filter((line) => isRow(line, format)).length);
  const best = Math.max(...scores);
  if (best > 0) return candidates[scores.indexOf(best)]!;
  const single = content.find(({ text }) =>
    ['point', 'comma'].some((decimal) => isNumber(text.trim(), decimal)),
  );
  if (single) {
    throw new ImportRefusal(
      `Only one column was found (line ${single.line}: ${quote(single.text)}). ` +
        'A table needs a column of wavelengths or energies and at least one of constants, ' +
        'separated by commas, semicolons, tabs or spaces.',
    );
  }
  const mixed = content.find(hasBothSigns);
  if (mixed) {
    throw new ImportRefusal(
      `Line ${mixed.line} (${quote(mixed.text)}) has numbers with a point and numbers with a comma: ` +
        'write all with one decimal sign, and without separators between thousands.',
    );
  }
  const [first] = content;
  throw new ImportRefusal(
    first
      ? `No row of numbers was found; the first line is ${quote(first.text)} (line ${first.line}). ` +
          'A row is at least two numbers separated by commas, semicolons, tabs or spaces, without units in the cells.'
      : 'The file has no rows: everything in it is blank or a comment.',
  );
}

/** Is this line a row of numbers, or would be if all of them could be used? */
export function isRow(line: ContentLine, { delimiter, decimal }: TableFormat): boolean {
  const cells = cellsOf(line, delimiter);
  if (cells.filter((cell) => cell !== '').length < 2) return false;
  return cells.every((cell) => looksNumeric(cell, decimal)) && cells.some((cell) => isNumber(cell, decimal));
}

/** A row whose cells are numbers, but not all by the same decimal sign. */
function hasBothSigns(line: ContentLine): boolean {
  return candidates.some(({ delimiter }) => {
    const cells = cellsOf(line, delimiter).filter((cell) => cell !== '');
    return cells.length > 1 && cells.every((cell) => isNumber(cell, 'point') || isNumber(cell, 'comma'));
  });
}

/** While formats are tried, a line that cannot be split is no row; it is refused when the table is read. */
function cellsOf(line: ContentLine, delimiter: Delimiter): string[] {
  try {
    return splitCells(line, delimiter);
  } catch (error) {
    if (error instanceof ImportRefusal) return [];
    throw error;
  }
}

function isNumber(cell: string, decimal: string): boolean {
  const value = cellNumber(cell, decimal === 'comma' ? 'comma' : 'point');
  return value !== null && !Number.isNaN(value);
}

/** Lines from the beginning, the middle and the end. */
function sampleOf(content: ContentLine[]): ContentLine[] {
  if (content.length <= SAMPLE_LINES) return content;
  const step = content.length / (SAMPLE_LINES / 2);
  const spread = Array.from({ length: SAMPLE_LINES / 2 }, (_, i) => content[Math.floor(i * step)]!);
  return [...content.slice(0, SAMPLE_LINES / 2), ...spread];
}

function quote(text: string): string {
  return JSON.stringify(text.length > 60 ? `${text.slice(0, 60)}...` : text);
}
