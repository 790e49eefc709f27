import type { Material, MaterialContent } from '../../../../shared/material.ts';
import type { MaterialSource } from '../../../../shared/materialSource.ts';

/** Values of tests; the numbers stand for nothing. */

export function buildSource(overrides: Partial<MaterialSource> = {}): MaterialSource {
  return {
    citation: 'A. Author, J. Opt. 1, 2 (1999)',
    doi: '10.1000/1',
    licence: null,
    sample: 'film, 40 nm',
    temperature: '295 K',
    method: null,
    confidence: 'measured',
    caution: null,
    ...overrides,
  };
}

export function buildContent(overrides: Partial<MaterialContent> = {}): MaterialContent {
  return {
    index: { kind: 'table', wavelengthsNm: [500, 600.25], n: [1.5, 1.4999], k: [0, 1e-7] },
    indexSource: buildSource(),
    voigt: null,
    voigtSource: null,
    ...overrides,
  };
}

export function buildMaterial(overrides: Partial<Material> = {}): Material {
  return {
    id: 'm1',
    version: 1,
    name: 'Glass',
    formula: 'SiO2',
    class: 'dielectric',
    groupId: 'group',
    rangeNm: [500, 600.25],
    voigtRangeNm: null,
    preferred: false,
    citation: 'A. Author, J. Opt. 1, 2 (1999)',
    confidence: 'measured',
    voigtConfidence: null,
    indexKind: 'table',
    voigtKind: null,
    anisotropy: null,
    updatedAt: '2026-03-01T10:00:00.000Z',
    content: buildContent(),
    curves: { wavelengthsNm: [500, 600], n: [1.5, 1.5], k: [0, 0], voigt: null, extraordinary: null },
    notes: [],
    newestVersion: 1,
    author: 'A. Grower',
    madeAt: '2026-03-01T10:00:00.000Z',
    ...overrides,
  };
}
