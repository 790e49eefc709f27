import { describe, expect, test } from 'vitest';
import { importTableSchema } from '../../shared/materialImport.ts';
import { readTable } from '../../worker/import/readTable.ts';

// Formats: common practice, no source. What is right is what a person reads in the text.
const bytesOf = (text: string) => new TextEncoder().encode(text);
const columnsOf = (text: string) => readTable(bytesOf(text)).columns.map((column) => Array.from(column));
const three = [
  [400, 500],
  [1.5, 1.25],
  [2, 3.5],
];

function utf16(text: string, isLittle: boolean): Uint8Array {
  const bytes = new DataView(new ArrayBuffer(2 * text.length + 2));
  Array.from(`\ufeff${text}`).forEach((one, i) => bytes.setUint16(2 * i, one.charCodeAt(0), isLittle));
  return new Uint8Array(bytes.buffer);
}

describe('a table of numbers is read', () => {
  test.each([
    ['comma', '400,1.5,2\n500,1.25,3.5'],
    ['semicolon', '400;1.5;2\n500;1.25;3.5'],
    ['semicolon and decimal comma', '400;1,5;2\n500;1,25;3,5'],
    ['tab', '400\t1.5\t2\n500\t1.25\t3.5'],
    ['tab and decimal comma', '400\t1,5\t2,0\n500\t1,25\t3,5'],
    ['spaces', '  400   1.5 2\n  500\t 1.25 3.5  '],
    ['spaces and decimal comma', '400 1,5 2\n500 1,25 3,5'],
    ['comma and spaces', '400, 1.5, 2\n500, 1.25, 3.5'],
    ['quoted cells', '"400","1.5","2"\n"500","1.25","3.5"'],
    ['quoted decimal commas', '"400","1,5","2"\n"500","1,25","3,5"'],
    ['CRLF and a mark of UTF-8', '\ufeffnm,n,k\r\n400,1.5,2\r\n500,1.25,3.5\r\n'],
    ['CR', 'nm,n,k\r400,1.5,2\r500,1.25,3.5\r'],
    ['comments and blank lines anywhere', '# a\n\n400,1.5,2\n% b\n! c\n; words\n\n// d\n500,1.25,3.5\n#'],
    ['delimiters at the end', 'nm;n;k;\n400;1.5;2;\n500;1.25;3.5;'],
    ['exponents, also of Fortran, and the typographic minus', '4e2,1.5D+00,2\n500,+1.25,35e\u22121'],
    ['words before', 'Cobalt, a film\nmeasured\nnm,n,k\n400,1.5,2\n500,1.25,3.5'],
  ])('%s', (_what, text) => {
    expect(columnsOf(text)).toEqual(three);
  });

  test.each(['utf-16le', 'utf-16be'] as const)('%s by its mark', (encoding) => {
    const { columns, table } = readTable(
      utf16('λ (µm),n,k\n400,1.5,2\n500,1.25,3.5', encoding === 'utf-16le'),
    );
    expect(columns.map((column) => Array.from(column))).toEqual(three);
    expect(table.columns[0]!.header).toBe('λ (µm)');
    expect(table.suggestion!.spectral).toEqual({ column: 0, unit: 'um' });
  });

  test('a header in Latin-1', () => {
    const text = 'wavelength (\u00b5m),n,k\n0.4,1.5,2\n0.5,1.25,3.5';
    const { table } = readTable(Uint8Array.from(text, (one) => one.charCodeAt(0)));
    expect(table.columns[0]!.header).toBe('wavelength (µm)');
    expect(table.suggestion!.spectral.unit).toBe('um');
  });

  test('with what a person must know of it', () => {
    const { table, lines } = readTable(bytesOf('# Co film\nsome words\nwl,n,k\n400,1.5,\n500,1.25,3.5\n'));
    expect(importTableSchema.parse(table)).toEqual(table);
    expect(Array.from(lines)).toEqual([4, 5]);
    expect(table).toMatchObject({
      delimiter: 'comma',
      decimal: 'point',
      headerLine: 3,
      comments: ['Co film'],
      columns: [
        { header: 'wl', least: 400, greatest: 500 },
        { header: 'n', least: 1.25, greatest: 1.5 },
        { header: 'k', least: 3.5, greatest: 3.5 },
      ],
      rowCount: 2,
      firstRows: [
        { line: 4, cells: [400, 1.5, null] },
        { line: 5, cells: [500, 1.25, 3.5] },
      ],
      lastRows: [],
    });
    expect(table.warnings.map(({ code, lines: where }) => [code, where])).toEqual([
      ['skipped-lines', [2]],
      ['empty-cells', [4]],
    ]);
  });

  test('with a doubt where commas may separate thousands or decimals', () => {
    expect(readTable(bytesOf('1,500;2,250\n1,600;3,125')).table.warnings[0]!.message).toMatch(
      /separate thousands/,
    );
    expect(readTable(bytesOf('0,500;2,250\n0,600;3,125')).table.warnings).toEqual([]);
    expect(readTable(bytesOf('400,1,5\n500,2,6')).table.warnings[0]!.message).toMatch(/decimal signs/);
  });

  test('with 100,000 rows, each on its line, with progress that rises to 1', () => {
    const rows = Array.from({ length: 100_000 }, (_, i) => `${300 + i / 64},${i / 128},${i % 7}`);
    const seen: number[] = [];
    const { columns, lines, table } = readTable(bytesOf(`nm,n,k\n${rows.join('\n')}`), (part) =>
      seen.push(part),
    );
    expect(table.rowCount).toBe(100_000);
    expect(columns[0]!.every((value, i) => value === 300 + i / 64)).toBe(true);
    expect(columns[1]!.every((value, i) => value === i / 128)).toBe(true);
    expect(columns[2]!.every((value, i) => value === i % 7)).toBe(true);
    expect(lines[99_999]).toBe(100_001);
    expect(seen.length).toBeGreaterThan(20);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    expect(seen.at(-1)).toBe(1);
  });
});

describe('what is no table is refused with the remedy', () => {
  test.each<[string, string | number[], RegExp]>([
    ['an empty file', '', /empty/],
    ['comments alone', '# a\n# b', /no rows/],
    ['words', 'hello\nworld', /No row of numbers.*"hello" \(line 1\)/],
    [
      'thousands beside points',
      'nm,n,k\n"1,000",0.5,3',
      /Line 2 .*point and numbers with a comma.*thousands/,
    ],
    ['points between thousands', 'nm;n;k\n1.000;0,5;3', /Line 2 .*one decimal sign/],
    ['one column', '400\n500', /Only one column.*line 1/],
    ['zero bytes', [52, 48, 0, 1], /binary file: byte 3/],
    ['.xlsx', [0x50, 0x4b, 3, 4, 20, 0], /save the sheet as CSV/],
    ['.xls', [0xd0, 0xcf, 0x11, 0xe0, 0xa1], /save the sheet as CSV/],
    ['PDF', '%PDF-1.7\n1,2', /PDF.*paste/],
    ['HTML', '<!DOCTYPE html><table>', /HTML page/],
    ['XML', '<?xml version="1.0"?><a/>', /XML/],
    ['JSON', '{"n": [1, 2]}', /JSON/],
    ['NaN', 'nm,n,k\n400,1,2\n500,NaN,2', /Line 3, column 2 \(n\): "NaN" is no number/],
    ['NaN in the first row', 'nm,n\n400,nan', /Line 2, column 2 \(n\)/],
    ['Infinity', '400,1\n500,-Infinity', /Line 2, column 2: "-Infinity" is no number/],
    ['a number too large', '400,1\n500,1e999', /Line 2, column 2: "1e999" is larger/],
    ['text', '400,1\n500,high\n600,1', /Line 2, column 2: "high" is text/],
    ['a thousands separator', 'wl;n\n1.234,5;2\n1.300,5;3', /Line 2, column 1 \(wl\): "1.234,5".*thousands/],
    ['two decimal signs', '400;1,5\n500;1,6\n600;1.7', /Line 3, column 2: "1.7" has another decimal sign/],
    ['a short row', '400,1,2\n500,1\n600,1,2', /Line 2 has 2 cells, the first row \(line 1\) has 3/],
    ['a long row', 'nm,n\n400,1,5', /Line 2 has 3 cells, the header \(line 1\) has 2.*semicolons/],
    ['an open quotation mark', '400,1\n"500,2\n600,3', /Line 2: a quotation mark is not closed/],
    ['too many columns', Array.from({ length: 65 }, (_, i) => i).join(','), /65 columns, the limit is 64/],
    ['too many rows', '1,2\n'.repeat(200_001), /200001 rows, the limit is 200000/],
  ])('%s', (_what, given, message) => {
    const bytes = typeof given === 'string' ? bytesOf(given) : Uint8Array.from(given);
    expect(() => readTable(bytes)).toThrow(message);
  });

  test('too many bytes', () => {
    expect(() => readTable(new Uint8Array(20_000_001).fill(49))).toThrow(/20 MB, the limit is 20 MB/);
  });
});

describe('columns are recognised', () => {
  const suggest = (header: string, row: string) =>
    readTable(bytesOf(`${header}\n${row}\n`)).table.suggestion!;

  test.each([
    ['Wavelength (nm)', 'nm'],
    ['lambda [um]', 'um'],
    ['wl_um', 'um'],
    ['µm', 'um'],
    ['wavelength / Å', 'A'],
    ['Photon energy (eV)', 'eV'],
    ['E', 'eV'],
    ['Wavenumber (cm^-1)', 'cm-1'],
    ['f (THz)', 'THz'],
  ])('%s is in %s', (header, unit) => {
    expect(suggest(`${header};n;k`, '1;2;3').spectral).toEqual({ column: 0, unit });
  });

  test.each([
    ['nm;n;kappa', { index: { from: 'n, k', n: 1, k: 2 }, voigt: null }],
    ['nm;Re(n);Im(n)', { index: { from: 'n, k', n: 1, k: 2 } }],
    ['nm;e1;e2', { index: { from: 'eps1, eps2', eps1: 1, eps2: 2 } }],
    ['nm;Im(eps);Re(eps)', { index: { from: 'eps1, eps2', eps1: 2, eps2: 1 } }],
    ["nm;Q';Q''", { voigt: { from: 'Q', re: 1, im: 2 } }],
    ['nm;Re Q;Im Q', { voigt: { from: 'Q', re: 1, im: 2 } }],
    ['nm;eps_xy_re;eps_xy_im', { voigt: { from: 'eps_xy', re: 1, im: 2 } }],
    ['nm;sigma_1xy (S/m);sigma_2xy (S/m)', { voigt: { from: 'sigma_xy', re: 1, im: 2, unit: 'S/m' } }],
    [
      'nm;theta_K (mdeg);eta_K (mdeg)',
      { voigt: { from: 'Kerr angles', rotation: 1, ellipticity: 2, unit: 'mdeg' } },
    ],
    ['nm;Kerr rotation [deg];Ellipticity [deg]', { voigt: { from: 'Kerr angles', unit: 'deg' } }],
  ])('%s', (header, expected) => {
    expect(suggest(header, '400;2;3')).toMatchObject(expected);
  });

  test('units on a line of their own, a header in a comment, and values without any header', () => {
    const { suggestion, headerLine } = readTable(bytesOf('Energy,n,k\neV,,\n1.5,2,3\n')).table;
    expect([suggestion!.spectral.unit, headerLine]).toEqual(['eV', 1]);
    expect(readTable(bytesOf('# film\n# wl_um n k\n0.5 2 3\n')).table.suggestion!.spectral.unit).toBe('um');
    const bare = readTable(bytesOf('400 -5 3 0.01 0.02\n500 -6 3 0.01 0.02\n')).table.suggestion;
    expect(bare).toMatchObject({ index: { from: 'eps1, eps2' }, voigt: { from: 'Q', re: 3, im: 4 } });
    expect(bare!.habits).toEqual({
      time: 'exp(-iwt)',
      voigtSign: '+iQ',
      magnetization: 'into the film',
      rotation: 'counter-clockwise',
      ellipticity: 'counter-clockwise',
    });
  });
});
