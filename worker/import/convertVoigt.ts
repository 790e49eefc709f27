import type { Complex } from '../../shared/complex.ts';
import type { IndexDispersion, VoigtDispersion } from '../../shared/dispersion.ts';
import type { ImportMapping, ImportWarning } from '../../shared/materialImport.ts';
import { canonicalVoigt } from './canonicalVoigt.ts';
import { ConversionError } from './conversionError.ts';
import { indexAt, outsideIndexWarning } from './indexAtRows.ts';
import type { ReadTable } from './readTable.ts';
import { emptyRowsWarning } from './rowsLeftOut.ts';
import type { SpectralRows } from './spectralRows.ts';
import { describeLines } from './warningLines.ts';

export type TabledVoigt = Extract<VoigtDispersion, { kind: 'table' }>;

/** Q with the line that each value came from, and N where it is known. */
export type ConvertedVoigt = {
  table: TabledVoigt;
  lines: number[];
  index: (Complex | null)[];
  sentences: string[];
  warnings: ImportWarning[];
};

/**
 * Q in our convention from Q, eps_xy, sigma_xy or the Kerr angles of the bulk.
 *
 * @param index N of the material: of the file itself or of another material; null only for a tabulated Q
 * @throws ConversionError when no row has N, or an angle belongs to no Q
 */
export function convertVoigt(
  { columns, lines: fileLines }: ReadTable,
  { rows, wavelengthsNm }: SpectralRows,
  {
    voigt: mapping,
    index: indexMapping,
    habits,
  }: ImportMapping & { voigt: NonNullable<ImportMapping['voigt']> },
  index: IndexDispersion | null,
): ConvertedVoigt {
  const [first, second] =
    mapping.from === 'Kerr angles' ? [mapping.rotation, mapping.ellipticity] : [mapping.re, mapping.im];
  const entered = rows.map((row): Complex => [
    columns[first]![row]!,
    second === null ? 0 : columns[second]![row]!,
  ]);
  const filled = rows.map((_, i) => i).filter((i) => !entered[i]!.some(Number.isNaN));
  if (filled.length === 0) {
    throw new ConversionError([
      { path: 'voigt', message: 'has no row with a number in every chosen column' },
    ]);
  }
  const known = index ? indexAt(index, wavelengthsNm) : wavelengthsNm.map(() => null);
  const linesOf = (positions: number[]) => positions.map((i) => fileLines[rows[i]!]!);
  const needsIndex = mapping.from !== 'Q';
  const kept = needsIndex ? filled.filter((i) => known[i] !== null) : filled;
  const empty = rows.map((_, i) => i).filter((i) => entered[i]!.some(Number.isNaN));
  const warnings: ImportWarning[] = emptyRowsWarning('Q', linesOf(empty));
  if (kept.length < filled.length && index) {
    warnings.push(outsideIndexWarning(linesOf(filled.filter((i) => known[i] === null)), index));
  }
  if (kept.length === 0) {
    const message = `gives N at none of the wavelengths: ${warnings.at(-1)?.message ?? 'there is no index.'} Choose a material whose index reaches there`;
    throw new ConversionError([{ path: indexMapping ? 'index' : 'indexOf', message }]);
  }
  const { toVoigt, sentences } = canonicalVoigt(mapping, habits);
  const q = kept.map((i) => toVoigt(entered[i]!, known[i]!, wavelengthsNm[i]!));
  const failed = kept.filter((_, i) => !q[i]?.every(Number.isFinite));
  if (failed.length > 0) {
    const what =
      mapping.from === 'Kerr angles'
        ? 'belong to no Q: angles must be below 45 deg; check their unit'
        : 'give no finite Q: check N there';
    const message = `the values in ${describeLines(linesOf(failed))} ${what}`;
    throw new ConversionError([
      { path: mapping.from === 'Kerr angles' ? 'voigt.unit' : 'voigt.re', message },
    ]);
  }
  if (second === null) sentences.unshift(`No imaginary column was chosen: ${mapping.from} is real.`);
  return {
    table: {
      kind: 'table',
      wavelengthsNm: kept.map((i) => wavelengthsNm[i]!),
      q: q.flatMap((value) => (value ? [value] : [])),
    },
    lines: linesOf(kept),
    index: kept.map((i) => known[i]!),
    sentences,
    warnings,
  };
}
