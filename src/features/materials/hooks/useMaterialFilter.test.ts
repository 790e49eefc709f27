import { describe, expect, it } from 'vitest';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { filterMaterials } from './useMaterialFilter.ts';

function buildMaterial(id: string, overrides: Partial<MaterialSummary> = {}): MaterialSummary {
  return {
    id,
    version: 1,
    name: id,
    formula: id,
    class: 'noble',
    groupId: null,
    rangeNm: [200, 2000],
    voigtRangeNm: null,
    preferred: false,
    citation: '',
    confidence: 'measured',
    voigtConfidence: null,
    indexKind: 'table',
    voigtKind: null,
    anisotropy: null,
    updatedAt: '2026-03-01T09:00:00.000Z',
    ...overrides,
  };
}

const library = [
  buildMaterial('co', { name: 'Cobalt', formula: 'Co', class: 'magnet', voigtRangeNm: [632.8, 632.8] }),
  buildMaterial('cr', { name: 'Chromium', formula: 'Cr', class: 'refractory', citation: 'Example 1974' }),
  buildMaterial('mn', { name: 'Manganese', formula: 'Mn', class: 'magnet', citation: 'Example 1974' }),
];
const all = { words: '', class: 'all', magnetoOptic: false } as const;
const found = (change: Partial<Parameters<typeof filterMaterials>[1]>) =>
  filterMaterials(library, { ...all, ...change }).map((material) => material.id);

describe('filterMaterials', () => {
  it('shows everything when nothing is asked', () => {
    expect(found({})).toEqual(['co', 'cr', 'mn']);
  });

  it('wants every word, in name, formula or source, in any case', () => {
    expect(found({ words: 'example 1974' })).toEqual(['cr', 'mn']);
    expect(found({ words: ' MANG  1974 ' })).toEqual(['mn']);
    expect(found({ words: 'cobalt 1974' })).toEqual([]);
  });

  it('joins class and magneto-optic constant', () => {
    expect(found({ class: 'magnet' })).toEqual(['co', 'mn']);
    expect(found({ class: 'magnet', magnetoOptic: true })).toEqual(['co']);
  });
});
