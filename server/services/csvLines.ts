import type { MaterialSource } from '../../shared/materialSource.ts';
import type { UsedMaterial } from '../../shared/run.ts';

/** Where every constant comes from, a line of `# ` for each: what is computed is worth no more than they are. */
export function sourceLines(materials: UsedMaterial[]): string {
  const lines = materials.flatMap(({ name, id, version, indexSource, voigtSource, anisotropySource }) => {
    const given = [
      { of: 'n and k', source: indexSource },
      { of: 'Q', source: voigtSource },
      { of: 'anisotropy', source: anisotropySource },
    ];
    return given.flatMap(({ of, source }) =>
      source ? [`${name} (${id}, version ${version}), ${of}: ${describeSource(source)}`] : [],
    );
  });
  return commentLines(lines);
}

function describeSource(source: MaterialSource): string {
  const { citation, doi, licence, sample, temperature, method, confidence, caution } = source;
  const parts = { DOI: doi, licence, sample, temperature, method, confidence, caution };
  const said = Object.entries(parts).flatMap(([field, value]) => (value ? [`${field}: ${value}`] : []));
  return [citation, ...said].join('; ');
}

/** A line of `# ` for each text, in front of the table. */
export function commentLines(lines: string[]): string {
  return lines.map((line) => `# ${line.replace(/\s+/g, ' ')}\r\n`).join('');
}

/** A line of CSV (RFC 4180). */
export function toCsvLine(fields: string[]): string {
  return `${fields.map((field) => (/[",\r\n]/.test(field) ? `"${field.replaceAll('"', '""')}"` : field)).join(',')}\r\n`;
}

/** A line of cells; one without a value is empty. */
export function cellLine(cells: (string | number | null | undefined)[]): string {
  return toCsvLine(cells.map((cell) => String(cell ?? '')));
}
