import type { ImportMapping, ImportWarning } from '../../shared/materialImport.ts';
import { isSameWavelength } from '../dispersion/range.ts';
import { ConversionError } from './conversionError.ts';
import type { ReadTable } from './readTable.ts';
import { emptyRowsWarning } from './rowsLeftOut.ts';
import { describeLines, firstLines } from './warningLines.ts';
import { describeSpectral, wavelengthNm } from './wavelengthNm.ts';

/** Rows of a table that have a wavelength, rising, each wavelength once. */
export type SpectralRows = {
  wavelengthsNm: number[];
  /** Positions in the columns of the table. */
  rows: number[];
  sentences: string[];
  warnings: ImportWarning[];
};

/**
 * Orders the rows by wavelength.
 *
 * @param used the columns that are taken over: rows of one wavelength must agree in them
 * @throws ConversionError for wavelengths that are not above 0 and for rows that contradict each other
 */
export function spectralRows(
  { columns, lines }: ReadTable,
  { column, unit }: ImportMapping['spectral'],
  used: readonly number[],
): SpectralRows {
  const spectral = columns[column]!;
  const rows = Array.from(spectral, (_, row) => row).filter((row) => !Number.isNaN(spectral[row]));
  const linesOf = (positions: number[]) => positions.map((row) => lines[row]!);
  const isWavelength = (value: number) => value > 0 && Number.isFinite(wavelengthNm(value, unit));
  const wrong = rows.filter((row) => !isWavelength(spectral[row]!));
  if (wrong.length > 0) {
    const message = `must be above 0 and give a finite wavelength everywhere, but does not in ${describeLines(linesOf(wrong))}: choose the column of wavelengths or energies, or delete these rows`;
    throw new ConversionError([{ path: 'spectral.column', message }]);
  }
  const nm = Float64Array.from(spectral, (value) => wavelengthNm(value, unit));
  const sentences = [describeSpectral(unit)];
  const empty = Array.from(lines).filter((_, row) => Number.isNaN(spectral[row]));
  const warnings: ImportWarning[] = emptyRowsWarning('The row', empty);
  const steps = rows.slice(1).map((row, i) => nm[row]! - nm[rows[i]!]!);
  const isFalling = steps.length > 0 && steps.every((step) => step <= 0);
  const isRising = steps.every((step) => step >= 0);
  if (isFalling && !isRising) sentences.push('The rows were reversed, so that the wavelength rises.');
  if (!isFalling && !isRising) {
    const mostlyFalling = steps.filter((step) => step < 0).length * 2 > steps.length;
    const breaks = rows.slice(1).filter((_, i) => (mostlyFalling ? steps[i]! > 0 : steps[i]! < 0));
    sentences.push('The rows were sorted by wavelength.');
    warnings.push({
      code: 'unsorted',
      message: `The wavelengths do not go one way: the order breaks at ${describeLines(linesOf(breaks))}. The rows were sorted; check that no second table hangs below the first.`,
      lines: firstLines(linesOf(breaks)),
    });
  }
  if (!isRising) rows.sort((a, b) => nm[a]! - nm[b]! || a - b);
  const kept: number[] = [];
  const equal: number[] = [];
  const contradicting: number[] = [];
  for (const row of rows) {
    const before = kept.at(-1);
    if (before === undefined || !isSameWavelength(nm[row]!, nm[before]!)) kept.push(row);
    else if (used.every((one) => Object.is(columns[one]![row], columns[one]![before]))) equal.push(row);
    else contradicting.push(before, row);
  }
  if (contradicting.length > 0) {
    const where = describeLines([...new Set(linesOf(contradicting))].sort((a, b) => a - b));
    const message = `is the same in rows whose constants differ (${where}): delete the rows that do not hold`;
    throw new ConversionError([{ path: 'spectral.column', message }]);
  }
  if (equal.length > 0) {
    const where = linesOf(equal).sort((a, b) => a - b);
    warnings.push({
      code: 'duplicate',
      message: `${describeLines(where).replace(/^l/, 'L')}: the same wavelength and constants as another row. The first of them was kept.`,
      lines: firstLines(where),
    });
  }
  return { wavelengthsNm: kept.map((row) => nm[row]!), rows: kept, sentences, warnings };
}
