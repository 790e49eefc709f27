import { describe, expect, it } from 'vitest';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { searchMaterials } from './materialSearch.ts';

function buildSummary(id: string, formula: string, name: string, preferred = true): MaterialSummary {
  return {
    id,
    version: 1,
    name,
    formula,
    class: 'noble',
    groupId: null,
    rangeNm: [200, 2000],
    voigtRangeNm: null,
    preferred,
    citation: 'Optical constants, 1972',
    confidence: 'measured',
    voigtConfidence: null,
    indexKind: 'table',
    voigtKind: null,
    anisotropy: null,
    updatedAt: '2026-03-01T09:00:00.000Z',
  };
}

const library = [
  buildSummary('au-2', 'Au', 'Gold, evaporated', false),
  buildSummary('c', 'C', 'Graphite'),
  buildSummary('au-1', 'Au', 'Gold'),
  buildSummary('co', 'Co', 'Cobalt'),
  buildSummary('sapphire', 'Al2O3', 'Sapphire'),
];
const found = (query: string) => searchMaterials(library, query).map(({ id }) => id);

describe('searchMaterials', () => {
  it('puts the formula as typed first, the preferred source before the other', () => {
    expect(found('au')).toEqual(['au-1', 'au-2']);
    expect(found('c')[0]).toBe('c');
    expect(found('gold')).toEqual(['au-1', 'au-2']);
  });

  it('wants every word, in formula, name, class or source', () => {
    expect(found('gold evaporated')).toEqual(['au-2']);
    expect(found('nothing of the kind')).toEqual([]);
    expect(found('')).toHaveLength(5);
    expect(found('noble 1972')).toHaveLength(5);
  });
});
