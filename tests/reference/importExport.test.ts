import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import { convertTable } from '../../worker/import/convertTable.ts';
import { exportMaterialCsv } from '../../worker/import/exportMaterialCsv.ts';
import type { ExportedMaterial } from '../../worker/import/exportedMaterial.ts';
import { readExportedMaterial } from '../../worker/import/readExportedMaterial.ts';
import { readTable } from '../../worker/import/readTable.ts';

const library = loadLibrary(fileURLToPath(new URL('../../data/library', import.meta.url)));
const exportable = library.map(({ name, formula, class: kind, notes, content }): ExportedMaterial => ({
  name,
  formula,
  class: kind,
  notes,
  content,
}));
const cobalt = exportable[library.findIndex(({ id }) => id === 'co-johnson-1974')]!;

/** Toward what the reader must give back: the same, to the last bit. */
const roundTrip = (material: ExportedMaterial) =>
  readExportedMaterial(exportMaterialCsv({ ...material, version: 3 }));

describe('an exported material', () => {
  test('of the shipped library is read back as it was', () => {
    expect(exportable.length).toBeGreaterThan(40);
    for (const material of exportable) expect(roundTrip(material), material.name).toEqual(material);
  });

  test('keeps every bit, texts of any kind, and what is no table', () => {
    const material: ExportedMaterial = {
      ...cobalt,
      name: 'Kobalt, "rein"; 30\u00a0nm',
      notes: ['first\nsecond # line', 'µ, λ'],
      content: {
        ...cobalt.content,
        index: {
          kind: 'table',
          wavelengthsNm: [400.00000000000006, 1239.841984 / 1.1],
          n: [1 / 3, 0.1 + 0.2],
          k: [5e-324, 1.7976931348623157e308],
        },
        voigt: {
          kind: 'table',
          wavelengthsNm: [400.00000000000006, 500],
          q: [
            [-1e-17, 0],
            [-0, 2 / 3],
          ],
        },
        anisotropy: {
          kind: 'uniaxial',
          extraordinary: { kind: 'formula', expression: 'c1 + L', coefficients: [1], rangeNm: [300, 900] },
          axis: [0, 0, 1],
        },
        thermal: { curieK: 1388, a: 2, b: 0.5, citation: 'made up for this test' },
      },
    };
    expect(roundTrip(material)).toEqual(material);
  });

  test('says in words what it is, and is a table for every other program', () => {
    const text = exportMaterialCsv({ ...cobalt, version: 3 });
    for (const line of [
      '# Skewlight material',
      `# name: ${cobalt.name}`,
      '# version: 3',
      `# n and k, citation: ${cobalt.content.indexSource.citation}`,
      `# n and k, DOI: ${cobalt.content.indexSource.doi}`,
      '# Q, confidence: from memory',
      'wavelength_nm,n,k,Q_re,Q_im',
    ]) {
      expect(text.split('\n')).toContain(line);
    }
    const read = readTable(new TextEncoder().encode(text));
    const { index, voigt } = convertTable(read, read.table.suggestion!, null);
    expect(index).toEqual(cobalt.content.index);
    expect(voigt).toEqual(cobalt.content.voigt);
  });

  test('survives a program that changes the line ends and adds a mark', () => {
    const text = `\ufeff${exportMaterialCsv({ ...cobalt, version: 1 }).replaceAll('\n', '\r\n')}`;
    expect(readExportedMaterial(text)).toEqual(cobalt);
  });
});

describe('reading back', () => {
  const text = exportMaterialCsv({ ...cobalt, version: 1 });

  test('leaves other files to the import', () => {
    expect(readExportedMaterial('# Cobalt\n400,1,2\n')).toBeNull();
  });

  test.each([
    ['without the definition', text.replace('# definition:', '# other:'), /"# definition:" is missing/],
    ['with a broken definition', text.replace('# definition: {', '# definition: {{'), /cannot be read/],
    ['without the header', text.replace('wavelength_nm,', 'wl,'), /wavelength_nm,n,k,Q_re,Q_im is missing/],
    ['with a word among the numbers', `${text}900,x,1,,\n`, /is not a row of 5 numbers/],
    ['with half of a number', `${text}9000,1,,,\n`, /lacks one of its numbers/],
    ['with gain', `${text}9000,1,-1,,\n`, /content\.index\.k\[\d+\].*>= 0/],
  ])('refuses one %s', (_what, damaged, message) => {
    expect(() => readExportedMaterial(damaged)).toThrow(message);
    expect(() => readExportedMaterial(damaged)).toThrow(/Export it again/);
  });
});
