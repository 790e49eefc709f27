import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { ImportMapping, ImportWarning } from '../../shared/materialImport.ts';
import { ConversionError } from './conversionError.ts';
import { convertIndex } from './convertIndex.ts';
import type { TabledIndex } from './convertIndex.ts';
import { convertVoigt } from './convertVoigt.ts';
import type { TabledVoigt } from './convertVoigt.ts';
import { indexWarnings, spectralWarnings, voigtWarnings } from './plausibility.ts';
import type { ReadTable } from './readTable.ts';
import { spectralRows } from './spectralRows.ts';

/** Constants in our convention, and how the entered values became them. */
export type ConvertedTable = {
  index: TabledIndex | null;
  voigt: TabledVoigt | null;
  sentences: string[];
  warnings: ImportWarning[];
};

/**
 * Turns a table into constants in the canonical convention.
 *
 * @param indexOf the material named by `mapping.indexOf`: its N turns the magneto-optic columns into Q where the file
 *   has none, and tells whether a tabulated Q is passive
 * @throws ConversionError whose issues have the paths of the mapping; what is only doubtful is a warning
 */
export function convertTable(
  read: ReadTable,
  mapping: ImportMapping,
  indexOf: MaterialContent | null,
): ConvertedTable {
  refuseColumns(read, mapping);
  const used = columnsOf(mapping).filter(({ path }) => path !== 'spectral.column');
  const rows = spectralRows(
    read,
    mapping.spectral,
    used.map(({ column }) => column),
  );
  if (rows.rows.length === 0) {
    throw new ConversionError([
      { path: 'spectral.column', message: 'has no numbers: choose another column' },
    ]);
  }
  const index = mapping.index && convertIndex(read, rows, mapping.index, mapping.habits.time);
  const known = index?.table ?? indexOf?.index ?? null;
  const { voigt: voigtMapping } = mapping;
  const voigt = voigtMapping && convertVoigt(read, rows, { ...mapping, voigt: voigtMapping }, known);
  const fromOther =
    voigt && !index && voigtMapping?.from !== 'Q' ? ['N was taken from the chosen material.'] : [];
  return {
    index: index?.table ?? null,
    voigt: voigt?.table ?? null,
    sentences: [...rows.sentences, ...(index?.sentences ?? []), ...fromOther, ...(voigt?.sentences ?? [])],
    warnings: [
      ...rows.warnings,
      ...spectralWarnings(read, mapping, rows),
      ...(index ? [...index.warnings, ...indexWarnings(index)] : []),
      ...(voigt ? [...voigt.warnings, ...voigtWarnings(voigt)] : []),
    ],
  };
}

/** The chosen columns with their paths in the mapping. */
function columnsOf({ spectral, index, voigt }: ImportMapping): { path: string; column: number }[] {
  const chosen = Object.entries({
    'spectral.column': spectral.column,
    ...(index?.from === 'n, k' ? { 'index.n': index.n, 'index.k': index.k } : {}),
    ...(index?.from === 'eps1, eps2' ? { 'index.eps1': index.eps1, 'index.eps2': index.eps2 } : {}),
    ...(voigt?.from === 'Kerr angles'
      ? { 'voigt.rotation': voigt.rotation, 'voigt.ellipticity': voigt.ellipticity }
      : voigt
        ? { 'voigt.re': voigt.re, 'voigt.im': voigt.im }
        : {}),
  });
  return chosen.flatMap(([path, column]) => (column === null ? [] : [{ path, column }]));
}

function refuseColumns({ columns }: ReadTable, mapping: ImportMapping): void {
  const chosen = columnsOf(mapping);
  const issues = chosen.flatMap(({ path, column }, position): Issue[] => {
    if (column >= columns.length) {
      return [
        { path, message: `must be one of the ${columns.length} columns, counted from 0; got ${column}` },
      ];
    }
    const other = chosen.slice(0, position).find((one) => one.column === column);
    return other ? [{ path, message: `is the same column as ${other.path}: choose another` }] : [];
  });
  if (issues.length > 0) throw new ConversionError(issues);
}
