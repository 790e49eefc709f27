import { describe, expect, it } from 'vitest';
import { ownHabits } from '../../../../shared/materialImport.ts';
import type { ImportMapping } from '../../../../shared/materialImport.ts';
import type { MaterialContent } from '../../../../shared/material.ts';
import { importedContent } from './importedContent.ts';
import { emptyNaming, namingRules, sourceOf } from './naming.ts';
import type { NamingForm } from './naming.ts';

const source = { ...emptyNaming.content.indexSource, citation: ' A paper ', confidence: 'measured' as const };
const other = { ...source, citation: 'Another paper', doi: 'https://doi.org/10.1000/x', caution: ' ' };
const form: NamingForm = {
  ...emptyNaming,
  name: 'Cobalt',
  formula: 'Co',
  class: 'magnet',
  content: { indexSource: source, voigtSource: other },
};

const mapping: ImportMapping = {
  spectral: { column: 0, unit: 'nm' },
  index: { from: 'n, k', n: 1, k: 2 },
  voigt: { from: 'Q', re: 3, im: 4 },
  indexOf: null,
  habits: ownHabits,
};

const base: MaterialContent = {
  index: { kind: 'table', wavelengthsNm: [500], n: [2], k: [3] },
  indexSource: { ...sourceOf(source), confidence: 'measured', citation: 'The base' },
  voigt: { kind: 'table', wavelengthsNm: [500], q: [[0.01, 0]] },
  voigtSource: { ...sourceOf(source), confidence: 'fitted', citation: 'Q of the base' },
};

describe('constants of an import', () => {
  it('take n, k and Q from the table with one source, or with one each', () => {
    const imported = { kind: 'import', importId: 'i1', mapping };
    const parts = { importId: 'i1', mapping, form, target: null, base: null };
    const together = importedContent(parts);
    expect(together.index).toEqual(imported);
    expect(together.voigt).toEqual(imported);
    expect(together.indexSource.citation).toBe('A paper');
    expect(together.voigtSource).toEqual(together.indexSource);
    const apart = importedContent({ ...parts, form: { ...form, apart: true } });
    expect(apart.voigtSource).toMatchObject({ citation: 'Another paper', doi: '10.1000/x', caution: null });
  });

  it('take N and its source from the chosen material where the table has only Q, but not the Q of that', () => {
    const content = importedContent({
      importId: 'i1',
      mapping: { ...mapping, index: null, indexOf: { material: 'fe', version: 1 } },
      form,
      target: null,
      base,
    });
    expect(content.index).toEqual(base.index);
    expect(content.indexSource.citation).toBe('The base');
    expect(content.voigtSource?.citation).toBe('Another paper');
    expect(
      importedContent({ importId: 'i1', mapping: { ...mapping, voigt: null }, form, target: null, base })
        .voigt,
    ).toBeNull();
  });

  it('leave what the table does not give as it is in a new version', () => {
    const content = importedContent({
      importId: 'i1',
      mapping: { ...mapping, voigt: null },
      form,
      target: base,
      base: null,
    });
    expect(content.voigt).toEqual(base.voigt);
    expect(content.voigtSource?.citation).toBe('Q of the base');
    expect(content.indexSource.citation).toBe('A paper');
  });
});

describe('the rules of name and source', () => {
  const problemsOf = (asked: Parameters<typeof namingRules>[0], values: NamingForm) =>
    (namingRules(asked).safeParse(values).error?.issues ?? []).map(({ path }) => path.join('.'));

  it('are those of the server, each problem at its field', () => {
    const all = { name: true, indexSource: true, voigtSource: true };
    expect(problemsOf(all, form)).toEqual([]);
    expect(problemsOf(all, { ...emptyNaming, apart: true })).toEqual([
      'name',
      'formula',
      'class',
      'content.indexSource.citation',
      'content.indexSource.confidence',
      'content.voigtSource.citation',
      'content.voigtSource.confidence',
    ]);
  });

  it('ask only for what the table gives', () => {
    const onlyVoigt = { name: false, indexSource: false, voigtSource: true };
    expect(problemsOf(onlyVoigt, emptyNaming)).toEqual([
      'content.voigtSource.citation',
      'content.voigtSource.confidence',
    ]);
  });
});
