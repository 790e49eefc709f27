import type { Material, MaterialSummary } from '../../../shared/material.ts';
import type { MaterialSource } from '../../../shared/materialSource.ts';

/** Materials for the tests of this feature: invented, no real substance. */
export const invented: MaterialSource = {
  citation: 'invented for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
};

export function buildSummary(id: string, overrides: Partial<MaterialSummary> = {}): MaterialSummary {
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

export function buildMaterial(overrides: Partial<Material> = {}): Material {
  return {
    ...buildSummary(overrides.id ?? 'co', { formula: 'Co', class: 'magnet' }),
    content: {
      index: { kind: 'table', wavelengthsNm: [500, 700], n: [2, 3], k: [1, 0] },
      indexSource: invented,
      voigt: null,
      voigtSource: null,
    },
    curves: { wavelengthsNm: [500, 700], n: [2, 3], k: [1, 0], voigt: null, extraordinary: null },
    notes: [],
    newestVersion: 1,
    author: null,
    madeAt: '2026-03-01T09:00:00.000Z',
    ...overrides,
  };
}
