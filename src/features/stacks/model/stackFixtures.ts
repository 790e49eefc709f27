import type { StackBlock, StackDocument, StackItem, StackLayer } from '../../../../shared/stack.ts';
import type { DrawnMaterial, Materials } from './media.ts';

/** Films for the tests of this feature: constants of the worked example in the solve contract, no real sample. */
export function buildLayer(overrides: Partial<StackLayer> = {}): StackLayer {
  return { id: 'pt', medium: { material: 'pt', version: 1 }, thicknessNm: 3, ...overrides };
}

export function buildBlock(layers: StackItem[], overrides: Partial<StackBlock> = {}): StackBlock {
  return { id: 'block', repeat: 20, layers, ...overrides };
}

export function buildDocument(overrides: Partial<StackDocument> = {}): StackDocument {
  return {
    incident: { index: 1 },
    layers: [
      buildLayer({ note: 'cap' }),
      buildLayer({ id: 'co', medium: { material: 'co', version: 1 }, thicknessNm: 1, m: [0, 0, 1] }),
      buildLayer({ id: 'ta', medium: { index: [3.5, 3.6] }, thicknessNm: 5 }),
    ],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 60, input: 'p', magnetization: { mode: 'drawn' } },
    ...overrides,
  };
}

export function buildMaterials(): Materials {
  const plain: DrawnMaterial = {
    version: 1,
    formula: 'Pt',
    class: 'noble',
    rangeNm: [248, 2032],
    voigtRangeNm: null,
    voigtConfidence: null,
    anisotropy: null,
  };
  return new Map([
    ['pt', plain],
    [
      'co',
      {
        ...plain,
        formula: 'Co',
        class: 'magnet' as const,
        rangeNm: [450, 1937] as [number, number],
        voigtRangeNm: [632.8, 632.8] as [number, number],
        voigtConfidence: 'from memory' as const,
      },
    ],
  ]);
}
