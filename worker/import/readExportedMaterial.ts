import { z } from 'zod';
import { describeIssues } from '../../shared/issues.ts';
import {
  DEFINITION_MARK,
  EXPORT_COLUMNS,
  EXPORT_MARK,
  exportedMaterialSchema,
  inColumns,
} from './exportedMaterial.ts';
import type { ExportedMaterial } from './exportedMaterial.ts';
import { ImportRefusal } from './importRefusal.ts';

const columnsSchema = z.strictObject({ kind: z.literal(inColumns.kind) });
const definitionSchema = z.looseObject({
  content: z.looseObject({ index: z.unknown(), voigt: z.unknown() }),
});

/** wavelength, n, k, Re Q, Im Q; null where the cell is empty. */
type Row = { line: number; cells: (number | null)[] };

/**
 * The material of a file that `exportMaterialCsv` wrote, with the same numbers to the last bit; null for another file.
 *
 * @throws ImportRefusal when such a file was damaged
 */
export function readExportedMaterial(text: string): ExportedMaterial | null {
  const lines = text.replace(/^\ufeff/, '').split(/\r\n|\n|\r/);
  if (lines[0]?.trimEnd() !== EXPORT_MARK) return null;
  const json = parseDefinition(lines.find((line) => line.startsWith(DEFINITION_MARK)));
  const definition = definitionSchema.safeParse(json);
  if (!definition.success) throw damaged('its definition has no content');
  const { content } = definition.data;
  const isIndexTabled = columnsSchema.safeParse(content.index).success;
  const isVoigtTabled = columnsSchema.safeParse(content.voigt).success;
  const rows = isIndexTabled || isVoigtTabled ? readRows(lines) : [];
  const whole = {
    ...definition.data,
    content: {
      ...content,
      ...(isIndexTabled ? { index: indexFrom(rows) } : {}),
      ...(isVoigtTabled ? { voigt: voigtFrom(rows) } : {}),
    },
  };
  const parsed = exportedMaterialSchema.safeParse(whole);
  if (parsed.success) return parsed.data;
  const [issue] = describeIssues(parsed.error, whole);
  throw damaged(issue ? `${issue.path}: ${issue.message}` : 'its content is not that of a material');
}

function parseDefinition(line: string | undefined): unknown {
  if (line === undefined) throw damaged('the line that begins with "# definition:" is missing');
  try {
    return JSON.parse(line.slice(DEFINITION_MARK.length));
  } catch {
    throw damaged('the line that begins with "# definition:" cannot be read');
  }
}

function readRows(lines: string[]): Row[] {
  const header = lines.indexOf(EXPORT_COLUMNS.join(','));
  if (header < 0) throw damaged(`the line ${EXPORT_COLUMNS.join(',')} is missing`);
  return lines.flatMap((text, position): Row[] => {
    if (position <= header || text.trim() === '' || text.startsWith('#')) return [];
    const line = position + 1;
    const cells = text.split(',').map((cell) => (cell.trim() === '' ? null : Number(cell)));
    if (
      cells.length !== EXPORT_COLUMNS.length ||
      cells.some((cell) => cell !== null && !Number.isFinite(cell))
    ) {
      throw damaged(`line ${line} is not a row of ${EXPORT_COLUMNS.length} numbers`);
    }
    return [{ line, cells }];
  });
}

function indexFrom(rows: Row[]) {
  const picked = pick(rows, 1, 2);
  return {
    kind: 'table',
    wavelengthsNm: picked.map(([nm]) => nm),
    n: picked.map(([, n]) => n),
    k: picked.map(([, , k]) => k),
  };
}

function voigtFrom(rows: Row[]) {
  const picked = pick(rows, 3, 4);
  return { kind: 'table', wavelengthsNm: picked.map(([nm]) => nm), q: picked.map(([, re, im]) => [re, im]) };
}

/** Wavelength and two columns of the rows that have them. */
function pick(rows: Row[], first: number, second: number): [number, number, number][] {
  return rows.flatMap(({ line, cells }): [number, number, number][] => {
    const [nm, a, b] = [cells[0] ?? null, cells[first] ?? null, cells[second] ?? null];
    if (a === null && b === null) return [];
    if (nm === null || a === null || b === null) throw damaged(`line ${line} lacks one of its numbers`);
    return [[nm, a, b]];
  });
}

function damaged(what: string): ImportRefusal {
  return new ImportRefusal(
    `This file begins like one that Skewlight exported, but ${what}. Export it again, or delete its first line to import it as a plain table.`,
  );
}
