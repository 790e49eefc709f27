import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialSource } from '../../shared/materialSource.ts';
import type { ResolvableMaterial } from './resolveCase.ts';

/** Made-up materials for tests. */

export const madeUpSource: MaterialSource = {
  citation: 'made up for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
};

export function buildContent(overrides: Partial<MaterialContent> = {}): MaterialContent {
  return {
    index: { kind: 'table', wavelengthsNm: [400, 632.8, 800], n: [1, 2, 3], k: [4, 5, 6] },
    indexSource: madeUpSource,
    voigt: null,
    voigtSource: null,
    ...overrides,
  };
}

/** A material `id@1` that is called by its id. */
export function buildMaterial(id: string, overrides: Partial<MaterialContent> = {}): ResolvableMaterial {
  return { id, version: 1, name: id, content: buildContent(overrides) };
}

export function buildLibrary(...materials: ResolvableMaterial[]): Map<string, ResolvableMaterial> {
  return new Map(materials.map((material) => [`${material.id}@${material.version}`, material]));
}

/** A free tensor with symmetric and antisymmetric parts. */
export const givenTensor: Extract<MaterialContent['index'], { kind: 'tensor' }>['epsilon'][number] = [
  [
    [4, 1],
    [0.5, 0.2],
    [0, 0],
  ],
  [
    [0.1, -0.2],
    [5, 1],
    [0.25, 0.5],
  ],
  [
    [0, 0],
    [-0.25, -0.5],
    [6, 1],
  ],
];
