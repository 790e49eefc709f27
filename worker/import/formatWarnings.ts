import type { ImportWarning } from '../../shared/materialImport.ts';
import type { ContentLine } from './contentLines.ts';
import type { TableFormat } from './detectFormat.ts';
import type { Header } from './findHeader.ts';

/** Readings of the decimal sign that the file leaves open: they are taken as they look, and said. */
export function formatWarnings(
  rows: ContentLine[],
  { delimiter, decimal }: TableFormat,
  header: Header | null,
): ImportWarning[] {
  const warning = (message: string): ImportWarning[] => [
    { code: 'unit', message, lines: rows.slice(0, 1).map(({ line }) => line) },
  ];
  if (decimal === 'comma' && rows.every(({ text }) => hasOnlyGroupsOfThree(text))) {
    return warning(
      'Every comma is followed by exactly three digits. They are read as decimal signs (1,500 is 1.5); ' +
        'if they separate thousands, write the numbers without them and import again.',
    );
  }
  if (
    delimiter === 'comma' &&
    decimal === 'point' &&
    !header &&
    rows.every(({ text }) => !/[.eEdD]/.test(text))
  ) {
    return warning(
      'No number has a decimal point, and commas separate the columns. If the commas are decimal signs, ' +
        'separate the columns by semicolons and import again.',
    );
  }
  return [];
}

/** 1,500 may be a thousand and a half or one and a half; 0,500 and 1,5 cannot be thousands. */
function hasOnlyGroupsOfThree(text: string): boolean {
  const numbers = text.match(/\d+,\d+/g) ?? [];
  return numbers.every((one) => /^[1-9]\d{0,2},\d{3}$/.test(one));
}
