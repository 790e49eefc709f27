import { describe, expect, it } from 'vitest';
import { isAscending, rowsOfPaste, sortedRows, usedRows } from './tableCells.ts';

describe('pasted cells', () => {
  it.each([
    ['a spreadsheet', 'nm\tn\tk\r\n500\t1.5\t0.1\r\n600\t1.4\t0.2\r\n'],
    ['comma-separated values', 'nm,n,k\n500,1.5,0.1\n600,1.4,0.2'],
    ['spaces', ' 500  1.5 0.1\n 600  1.4 0.2\n'],
  ])('of %s become rows without the header', (_, text) => {
    expect(rowsOfPaste(text)).toEqual([
      ['500', '1.5', '0.1'],
      ['600', '1.4', '0.2'],
    ]);
  });

  it('keep decimal commas beside semicolons and tabs', () => {
    expect(rowsOfPaste('500,5;1,5;0,1')).toEqual([['500,5', '1,5', '0,1']]);
    expect(rowsOfPaste('500,5\t1,5\t0,1')).toEqual([['500,5', '1,5', '0,1']]);
  });

  it('take 0 for an absent last column, and leave a single value to its cell', () => {
    expect(rowsOfPaste('500\t1.5')).toEqual([['500', '1.5', '0']]);
    expect(rowsOfPaste('1.5')).toBeNull();
    expect(rowsOfPaste('no numbers at all')).toBeNull();
  });
});

describe('rows', () => {
  it('are sorted only when asked, those without a wavelength last', () => {
    const rows = [['600', 'b', ''], ['', 'x', ''], ['500', 'a', '']]; // prettier-ignore
    expect(isAscending(rows)).toBe(false);
    expect(sortedRows(rows).map(([, second]) => second)).toEqual(['a', 'b', 'x']);
    expect(isAscending(sortedRows(rows))).toBe(true);
  });

  it('that are empty count only between others', () => {
    expect(usedRows([['1', '', ''], ['', '', ''], ['2', '', ''], ['', ' ', '']])).toHaveLength(3); // prettier-ignore
  });
});
