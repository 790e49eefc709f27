import type { ImportPreview, MaterialImport as PresentedImport } from '../../shared/materialImport.ts';
import type { ConvertedTable } from '../../worker/import/convertTable.ts';
import type { MaterialImport } from '../models/materialImport.ts';

/** Points of a previewed curve: more than a plot can show. */
const MOST_POINTS = 1_000;

/** @param progress of the reading, where this process does it */
export function presentImport(row: MaterialImport, progress: number): PresentedImport {
  const { id, groupId, fileName, size, state, error, tableJson, exported } = row;
  return {
    id,
    groupId,
    fileName,
    bytes: size,
    state,
    progress: state === 'ready' ? 1 : progress,
    error: error ?? null,
    table: tableJson ?? null,
    exported: exported ? { name: exported.name, formula: exported.formula, class: exported.class } : null,
  };
}

/** @throws Error for a conversion that gave neither constant, which the mapping's schema rules out */
export function presentPreview({ index, voigt, sentences, warnings }: ConvertedTable): ImportPreview {
  const tables = [index, voigt].filter((table) => table !== null);
  const wavelengths = tables.flatMap((table) => [table.wavelengthsNm[0]!, table.wavelengthsNm.at(-1)!]);
  if (wavelengths.length === 0) throw new Error('A conversion gave no constants');
  return {
    rowCount: Math.max(...tables.map((table) => table.wavelengthsNm.length)),
    rangeNm: [Math.min(...wavelengths), Math.max(...wavelengths)],
    index: index && {
      wavelengthsNm: thin(index.wavelengthsNm),
      n: thin(index.n),
      k: thin(index.k),
    },
    voigt: voigt && { wavelengthsNm: thin(voigt.wavelengthsNm), q: thin(voigt.q) },
    sentences,
    warnings,
  };
}

/** Evenly chosen entries, both ends among them. */
function thin<Value>(values: readonly Value[]): Value[] {
  if (values.length <= MOST_POINTS) return [...values];
  const step = (values.length - 1) / (MOST_POINTS - 1);
  return Array.from({ length: MOST_POINTS }, (_, place) => values[Math.round(place * step)]!);
}
