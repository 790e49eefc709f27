import type { Issue } from '../../shared/error.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import type { ImportMapping, ImportWarning } from '../../shared/materialImport.ts';
import { isUsable, unusableIndex } from '../dispersion/opticalValue.ts';
import { squareRoot } from '../optics/complexNumber.ts';
import { ConversionError } from './conversionError.ts';
import type { ReadTable } from './readTable.ts';
import type { SpectralRows } from './spectralRows.ts';
import { emptyRowsWarning } from './rowsLeftOut.ts';
import { describeLines, firstLines } from './warningLines.ts';

export type TabledIndex = Extract<IndexDispersion, { kind: 'table' }>;

/** Constants with the line that each came from. */
export type ConvertedIndex = {
  table: TabledIndex;
  lines: number[];
  sentences: string[];
  warnings: ImportWarning[];
};

/**
 * N = n + ik for exp(-iwt) from n and k or eps1 and eps2. With exp(+iwt) an absorbing source has N = n - ik; its k may be
 * written with this sign or without, which its own sign tells.
 *
 * @throws ConversionError where the constants would be those of no medium: k < 0, n < 0 or N = 0
 */
export function convertIndex(
  { columns, lines: fileLines }: ReadTable,
  { rows, wavelengthsNm }: SpectralRows,
  mapping: NonNullable<ImportMapping['index']>,
  time: ImportMapping['habits']['time'],
): ConvertedIndex {
  const [first, second] = mapping.from === 'n, k' ? [mapping.n, mapping.k] : [mapping.eps1, mapping.eps2];
  const valueOf = (column: number | null, row: number) => (column === null ? 0 : columns[column]![row]!);
  const isFilled = (row: number) => !Number.isNaN(valueOf(first, row)) && !Number.isNaN(valueOf(second, row));
  const kept = rows.map((_, i) => i).filter((i) => isFilled(rows[i]!));
  if (kept.length === 0) {
    throw new ConversionError([
      { path: 'index', message: 'has no row with a number in every chosen column' },
    ]);
  }
  const empty = rows.filter((row) => !isFilled(row)).map((row) => fileLines[row]!);
  const lines = kept.map((i) => fileLines[rows[i]!]!);
  const re = kept.map((i) => valueOf(first, rows[i]!));
  const im = kept.map((i) => valueOf(second, rows[i]!));
  const name = mapping.from === 'n, k' ? 'k' : 'eps2';
  const { sign, sentence, warnings } = signOfLoss(name, im, lines, time);
  const loss = im.map((value) => sign * value + 0);
  refuseGain(name, loss, lines, time);
  const table: TabledIndex = {
    kind: 'table',
    wavelengthsNm: kept.map((i) => wavelengthsNm[i]!),
    n: re,
    k: loss,
  };
  const sentences = [sentence];
  if (mapping.from === 'eps1, eps2') {
    const roots = re.map((value, i) => squareRoot([value, loss[i]!]));
    table.n = roots.map(([n]) => n);
    table.k = roots.map(([, k]) => k);
    sentences.push('N = n + ik is the square root of eps with k >= 0.');
  }
  if (second === null) sentences.push(`No column of ${name} was chosen: it is 0 everywhere.`);
  refuseNoMedium(mapping.from, table, lines);
  return { table, lines, sentences, warnings: [...emptyRowsWarning('N', empty), ...warnings] };
}

function signOfLoss(
  name: string,
  im: number[],
  lines: number[],
  time: ImportMapping['habits']['time'],
): { sign: 1 | -1; sentence: string; warnings: ImportWarning[] } {
  const whole = name === 'k' ? 'N = n' : 'eps = eps1';
  if (time === 'exp(-iwt)') {
    return { sign: 1, sentence: `${whole} + i ${name} was taken as it is (exp(-iwt)).`, warnings: [] };
  }
  const positive = lines.filter((_, i) => im[i]! > 0);
  if (positive.length === 0 || im.some((value) => value < 0)) {
    const sentence = `The source uses exp(+iwt) and gives Im ${whole.slice(0, whole.indexOf(' '))} with its sign: ${name} was multiplied by -1 (complex conjugate).`;
    return { sign: -1, sentence, warnings: [] };
  }
  return {
    sign: 1,
    sentence: `The source uses exp(+iwt) with ${whole} - i ${name}, ${name} written without sign: ${name} was taken as it is (complex conjugate of the source's).`,
    warnings: [
      {
        code: 'negative-k',
        message: `${name} is positive although exp(+iwt) was chosen: it was read as ${whole} - i ${name}. If the source writes ${whole} + i ${name}, choose exp(-iwt); this also changes Q.`,
        lines: firstLines(positive),
      },
    ],
  };
}

function refuseGain(
  name: string,
  loss: number[],
  lines: number[],
  time: ImportMapping['habits']['time'],
): void {
  const negative = lines.filter((_, i) => loss[i]! < 0);
  if (negative.length === 0) return;
  const isEverywhere = loss.every((value) => value <= 0);
  const where = describeLines(negative);
  const remedy =
    time === 'exp(-iwt)'
      ? 'does the source use exp(+iwt)? Choose it then'
      : 'a source with exp(+iwt) has one sign throughout';
  const message = `${name} < 0 after the conversion in ${where}: ${remedy}; if these values are noise around 0, write 0 in the file and import it again`;
  throw new ConversionError([{ path: isEverywhere ? 'habits.time' : `index.${name}`, message }]);
}

function refuseNoMedium(from: 'n, k' | 'eps1, eps2', { n, k }: TabledIndex, lines: number[]): void {
  const issues: Issue[] = [];
  const path = from === 'n, k' ? 'index.n' : 'index.eps1';
  const negative = lines.filter((_, i) => n[i]! < 0);
  if (negative.length > 0) {
    issues.push({
      path,
      message: `n < 0 in ${describeLines(negative)}: choose the column of n, or eps1 and eps2`,
    });
  }
  const zero = lines.filter((_, i) => n[i] === 0 && k[i] === 0);
  if (zero.length > 0) {
    issues.push({
      path,
      message: `N = 0 in ${describeLines(zero)}: n and k must not both be 0; delete these rows`,
    });
  }
  const absurd = lines.filter((_, i) => n[i]! + k[i]! > 0 && !isUsable([n[i]!, k[i]!]));
  if (absurd.length > 0) {
    const message = `${unusableIndex}, but does not in ${describeLines(absurd)}: correct or delete these rows`;
    issues.push({ path, message });
  }
  if (issues.length > 0) throw new ConversionError(issues);
}
