import { LIMITS } from '../../shared/limits.ts';
import { ImportRefusal } from './importRefusal.ts';

/** First bytes of files that are often renamed to .csv. */
const foreign: { starts: number[]; message: string }[] = [
  {
    starts: [0x50, 0x4b, 0x03, 0x04],
    message:
      'This is a ZIP archive, as .xlsx and .ods spreadsheets are: save the sheet as CSV and import that.',
  },
  {
    starts: [0xd0, 0xcf, 0x11, 0xe0],
    message: 'This is an old Excel workbook (.xls): save the sheet as CSV and import that.',
  },
  {
    starts: [0x25, 0x50, 0x44, 0x46],
    message: 'This is a PDF: copy the numbers of the table and paste them.',
  },
  { starts: [0x1f, 0x8b], message: 'This is a gzip archive: unpack it and import the table inside.' },
];

const SIZE = new Intl.NumberFormat('en', { maximumFractionDigits: 1 });

/**
 * Refuses what is no text, before anything is decoded.
 *
 * @throws ImportRefusal for an empty or too large file, archives, spreadsheets, PDF and other binary files
 */
export function refuseForeignFile(bytes: Uint8Array): void {
  if (bytes.length === 0) throw new ImportRefusal('The file is empty: it holds no bytes at all.');
  if (bytes.length > LIMITS.importBytes) {
    throw new ImportRefusal(
      `The file has ${SIZE.format(bytes.length / 1e6)} MB, the limit is ${LIMITS.importBytes / 1e6} MB: ` +
        'keep only the columns and rows that are needed.',
    );
  }
  const found = foreign.find(({ starts }) => starts.every((byte, position) => bytes[position] === byte));
  if (found) throw new ImportRefusal(found.message);
  const zero = bytes.indexOf(0);
  if (zero >= 0 && !startsAsUtf16(bytes)) {
    throw new ImportRefusal(
      `This is a binary file: byte ${zero + 1} is zero, which no text has. Save the table as CSV in UTF-8.`,
    );
  }
}

/** The mark (BOM) of UTF-16, whose Latin letters have zero bytes. */
export function startsAsUtf16(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be';
  return null;
}

/**
 * Refuses text of another kind than a table.
 *
 * @throws ImportRefusal for HTML, XML, JSON and RTF
 */
export function refuseForeignText(text: string): void {
  const start = text.slice(0, 1000).trimStart();
  const kind = /^<(!doctype\s+html|html|head|body|table)\b/i.test(start)
    ? 'an HTML page'
    : /^<(\?xml|[a-z][\w:-]*[\s>])/i.test(start)
      ? 'XML'
      : /^\{\\rtf/.test(start)
        ? 'a rich text document'
        : /^(\{\s*("|\})|\[\s*[[{"\d-])/.test(start)
          ? 'JSON'
          : null;
  if (kind === null) return;
  throw new ImportRefusal(`This is ${kind}, not a table: copy the rows of numbers out of it and paste them.`);
}
