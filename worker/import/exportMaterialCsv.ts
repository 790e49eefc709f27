import type { Material, MaterialContent } from '../../shared/material.ts';
import type { MaterialSource } from '../../shared/materialSource.ts';
import { materialCurves } from '../dispersion/materialCurves.ts';
import { DEFINITION_MARK, EXPORT_COLUMNS, EXPORT_MARK, inColumns } from './exportedMaterial.ts';
import type { ExportedMaterial } from './exportedMaterial.ts';

/**
 * A material as a CSV file that people, spreadsheets and `readExportedMaterial` can read. Comment lines give names,
 * sources and notes in words; one of them holds, as JSON, everything that the columns do not. Tables stand in the columns
 * with all digits; of formulas and models the columns show a sampled curve, and the JSON line has the formula.
 *
 * @param curves of this content, where a thread has sampled it: a formula may be somebody's
 */
export function exportMaterialCsv(
  material: ExportedMaterial & { version: number },
  curves = materialCurves(material.content),
): string {
  const { name, formula, class: kind, version, notes, content } = material;
  const definition = {
    name,
    formula,
    class: kind,
    notes,
    content: {
      ...content,
      index: content.index.kind === 'table' ? inColumns : content.index,
      voigt: content.voigt?.kind === 'table' ? inColumns : content.voigt,
    },
  };
  const { origin } = content;
  const header = [
    EXPORT_MARK,
    comment('name', name),
    comment('formula', formula),
    comment('class', kind),
    comment('version', String(version)),
    '# convention: time factor exp(-iwt), N = n + ik, eps_xy = +iQ N^2 for a magnetization along +z, into the film',
    ...sourceLines('n and k', content.indexSource),
    ...sourceLines('Q', content.voigtSource),
    ...sourceLines('anisotropy', content.anisotropySource ?? null),
    ...notes.map((note) => comment('note', note)),
    ...(origin?.index?.sentences ?? []).map((sentence) => comment('n and k, conversion', sentence)),
    ...(origin?.voigt?.sentences ?? []).map((sentence) => comment('Q, conversion', sentence)),
    ...sampledLines(content),
    `${DEFINITION_MARK}${JSON.stringify(definition)}`,
  ];
  return [...header, EXPORT_COLUMNS.join(','), ...bodyLines(content, curves), ''].join('\n');
}

function sourceLines(of: string, source: MaterialSource | null): string[] {
  if (source === null) return [];
  return Object.entries(source).flatMap(([field, value]) =>
    value ? [comment(`${of}, ${field === 'doi' ? 'DOI' : field}`, value)] : [],
  );
}

function sampledLines({ index, voigt }: MaterialContent): string[] {
  const line = (of: string, kind: string) =>
    `# ${of}: the columns show samples of a ${kind}; it stands in the definition`;
  return [
    ...(index.kind === 'table' ? [] : [line('n and k', index.kind)]),
    ...(voigt === null || voigt.kind === 'table' ? [] : [line('Q', voigt.kind)]),
  ];
}

/** One line, whatever the text holds. */
function comment(field: string, text: string): string {
  return `# ${field}: ${text.replace(/\s+/g, ' ').trim()}`;
}

function bodyLines(content: MaterialContent, curves: Material['curves']): string[] {
  const index = content.index.kind === 'table' ? content.index : curves;
  const voigt = content.voigt?.kind === 'table' ? content.voigt : curves.voigt;
  const rows = new Map<number, string[]>();
  index.wavelengthsNm.forEach((nm, i) => rows.set(nm, [digits(index.n[i]!), digits(index.k[i]!), '', '']));
  voigt?.wavelengthsNm.forEach((nm, i) => {
    const [n = '', k = ''] = rows.get(nm) ?? [];
    rows.set(nm, [n, k, ...voigt.q[i]!.map(digits)]);
  });
  return [...rows].sort(([a], [b]) => a - b).map(([nm, cells]) => [digits(nm), ...cells].join(','));
}

/** The shortest text that reads back to the same double. */
function digits(value: number): string {
  return Object.is(value, -0) ? '-0' : String(value);
}
