export type Decimal = 'point' | 'comma';

const withPoint = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;
const withComma = /^[+-]?(?:\d+,?\d*|,\d+)(?:e[+-]?\d+)?$/i;
/** How spreadsheets and programs write a number that is none. */
const noNumber =
  /^[+-]?(?:nan|inf(?:inity)?|1\.#\w+|#(?:n\/a|num!|div\/0!|value!|ref!|name\?|wert!|zahl!)|n\/?a|null|-+)$/i;
const thousands = /^[+-]?\d{1,3}(?:([.,' ])\d{3})+(?:[.,]\d+)?$/;

/**
 * The number in a cell; NaN for an empty cell, null for anything else. Fortran's exponent 1.5D+02 and the typographic
 * minus sign are read as what they mean. A number too large for a double is infinite.
 */
export function cellNumber(cell: string, decimal: Decimal): number | null {
  if (cell === '') return NaN;
  if ((decimal === 'comma' ? withComma : withPoint).test(cell)) {
    return Number(decimal === 'comma' ? cell.replace(',', '.') : cell);
  }
  const plain = cell
    .replace(/^\u2212/, '-')
    .replace(/d(?=[+-]?\d+$)/i, 'e')
    .replace(/e\u2212/i, 'e-');
  return plain === cell ? null : cellNumber(plain, decimal);
}

/** Cannot be anything but a number with thousands separators: 1.234,5 or 1'234'567. */
const surelyThousands = /^[+-]?\d{1,3}(?:(?:\.\d{3})+,|(?:,\d{3})+\.|(?:['’]\d{3})+[.,]?)\d*$/;

/** A cell of a column of numbers, whether or not its number can be used. */
export function looksNumeric(cell: string, decimal: Decimal): boolean {
  return noNumber.test(cell) || surelyThousands.test(cell) || cellNumber(cell, decimal) !== null;
}

/** Why a cell is not taken as a number, and what to do. */
export function describeBadCell(cell: string, decimal: Decimal): string {
  const shown = JSON.stringify(cell.length > 40 ? `${cell.slice(0, 40)}...` : cell);
  if (/^[+-]?(?:inf|1\.#inf|\d)/i.test(cell) && cellNumber(cell, decimal) !== null) {
    return `${shown} is larger than any number that can be stored`;
  }
  if (noNumber.test(cell)) {
    return `${shown} is no number: delete the row, or leave the cell empty where the value is not known`;
  }
  if (surelyThousands.test(cell) || thousands.test(cell)) {
    return `${shown} seems to have a thousands separator: write the number without it`;
  }
  if (cellNumber(cell, decimal === 'comma' ? 'point' : 'comma') !== null) {
    return `${shown} has another decimal sign than the rest, which has a decimal ${decimal}: use one throughout`;
  }
  return `${shown} is text in a column of numbers: delete it, or begin the line with # to make it a comment`;
}
