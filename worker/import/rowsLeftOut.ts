import type { ImportWarning } from '../../shared/materialImport.ts';
import { describeLines, firstLines } from './warningLines.ts';

/** Rows that give nothing to a constant because a cell of it is empty. */
export function emptyRowsWarning(name: string, lines: number[]): ImportWarning[] {
  if (lines.length === 0) return [];
  return [
    {
      code: 'empty-cells',
      message: `${name} was left out in ${describeLines(lines)}: a cell is empty there.`,
      lines: firstLines(lines),
    },
  ];
}
