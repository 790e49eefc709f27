import { describe, expect, it } from 'vitest';
import { stackDocumentSchema } from '../../../../shared/stack.ts';
import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import { mixedWith, oxideText, sampleSummary, withPart, withSample, withSpread } from './sampleParts.ts';

const film: StackDocument = {
  incident: { index: 1 },
  layers: [
    {
      id: 'block',
      repeat: 2,
      layers: [{ id: 'co', medium: { material: 'co', version: 2 }, thicknessNm: 3, m: [0, 0, 1] }],
    },
  ],
  substrate: { index: 1.5 },
  workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
};
const nameOf = ({ material, label }: StackMedium) => material ?? label ?? 'mix';
const inner = (document: StackDocument) => {
  const [block] = document.layers;
  return block && 'layers' in block ? block.layers[0] : undefined;
};

describe('the settings of a real sample', () => {
  const oxide = { medium: { index: 2.3, label: 'CoO' }, consumedNm: 1, expansion: 1.7 };
  const real = withSample(film, 'co', { gradedNm: 0.4, dead: { topNm: 0.2, bottomNm: 0.1 }, oxide });

  it('reach a layer inside a block, and the film stays one that can be saved', () => {
    expect(inner(real)).toMatchObject({ gradedNm: 0.4, dead: { topNm: 0.2, bottomNm: 0.1 }, oxide });
    expect(stackDocumentSchema.safeParse(real).success).toBe(true);
  });

  it('are said in a few words, and leave no trace when they are taken away', () => {
    expect(sampleSummary(film, nameOf)).toEqual([]);
    expect(sampleSummary(real, nameOf)).toEqual(['co oxidised', 'co graded 0.4 nm', 'co dead 0.3 nm']);
    const ideal = withSample(real, 'co', { gradedNm: 0, dead: { topNm: 0, bottomNm: 0 }, oxide: undefined });
    expect(ideal).toEqual(film);
  });

  it('spell out how much oxide a metal becomes', () => {
    const layer = inner(real);
    expect(layer && 'medium' in layer && oxideText(layer, 'Co', 'CoO')).toBe(
      '1 nm of Co become 1.7 nm of CoO; 2 nm of Co are left.',
    );
  });

  it('spread only what has a width', () => {
    const spread = withSpread(film, { bandwidthNm: 2 });
    expect(spread.spread).toEqual({ shape: 'normal', bandwidthNm: 2 });
    expect(withSpread(spread, { bandwidthNm: 0 })).toEqual(film);
  });
});

describe('a mixture', () => {
  const mixed = mixedWith({ material: 'co', version: 2 }, { index: 1, label: 'air' });

  it('keeps the version of its parts and drops their names', () => {
    expect(mixed.mixture?.parts).toEqual([{ material: 'co', version: 2 }, { index: 1 }]);
    expect(stackDocumentSchema.safeParse(withSample(film, 'co', { medium: mixed })).success).toBe(true);
  });

  it('exchanges one part', () => {
    expect(withPart(mixed.mixture!, 1, { material: 'au', version: 1 }).parts[1]).toEqual({
      material: 'au',
      version: 1,
    });
  });
});
