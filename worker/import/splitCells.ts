import Papa from 'papaparse';
import { ImportRefusal } from './importRefusal.ts';

export type Delimiter = 'comma' | 'semicolon' | 'tab' | 'space';

const characters = { comma: ',', semicolon: ';', tab: '\t' } as const;

/**
 * The cells of a line, without the blanks around them. Spaces and tabs in any number are one `space` delimiter.
 *
 * @throws ImportRefusal when a quotation mark is not closed on its line
 */
export function splitCells({ text, line }: { text: string; line: number }, delimiter: Delimiter): string[] {
  const cells = delimiter === 'space' ? text.trim().split(/\s+/) : text.split(characters[delimiter]);
  for (let i = 0; i < cells.length; i += 1) cells[i] = cells[i]!.trim();
  if (!text.includes('"')) return cells;
  // A parser for each line is slow; it is needed only for delimiters and quotation marks inside of quotes.
  return cells.every(isSimple)
    ? cells.map((cell) => cell.replaceAll('"', '').trim())
    : splitQuoted(text, line, delimiter);
}

/** A cell without quotation marks, or with one at each end. */
function isSimple(cell: string): boolean {
  const first = cell.indexOf('"');
  return first < 0 || (first === 0 && cell.length > 1 && cell.indexOf('"', 1) === cell.length - 1);
}

function splitQuoted(text: string, line: number, delimiter: Delimiter): string[] {
  const single =
    delimiter === 'space' ? text.trim().replace(/\s+/g, ' ') : text.replace(/(^|[,;\t])\s+"/g, '$1"');
  const { data, errors } = Papa.parse<string[]>(single, {
    delimiter: delimiter === 'space' ? ' ' : characters[delimiter],
    // A line break inside quotes was taken apart before; the quotation mark is then missing.
    newline: '\n',
  });
  if (errors.length > 0 || data.length !== 1) {
    throw new ImportRefusal(
      `Line ${line}: a quotation mark is not closed on this line. Every row must stand on one line.`,
    );
  }
  return data[0]!.map((cell) => cell.trim());
}
