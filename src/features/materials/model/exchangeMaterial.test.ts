import { describe, expect, it } from 'vitest';
import { stackDocumentSchema } from '../../../../shared/stack.ts';
import { buildSummary } from '../materialFixtures.ts';
import { commonRangeNm, exchangeMaterial, materialsIn } from './exchangeMaterial.ts';

// A film in which Pt stands in a layer, a block, an oxide, a mixture and as the substrate; no real sample.
const film = stackDocumentSchema.parse({
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { material: 'pt', version: 1 }, thicknessNm: 3 },
    {
      id: 'block',
      repeat: 5,
      layers: [
        {
          id: 'co',
          medium: { material: 'co', assumeConstant: true },
          thicknessNm: 1,
          m: [0, 0, 1],
          oxide: { medium: { material: 'pt' }, consumedNm: 0.2, expansion: 1.5 },
        },
        {
          id: 'mixed',
          medium: {
            mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ material: 'pt' }, { index: 2 }] },
          },
          thicknessNm: 2,
        },
      ],
    },
  ],
  substrate: { material: 'pt' },
  workingPoint: { wavelengthNm: 600, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
});

describe('exchangeMaterial', () => {
  it('puts the other material, in its version, wherever the first one stands', () => {
    const other = exchangeMaterial(film, ['pt'], { material: 'pt-new', version: 4 });
    expect(materialsIn(film)).toEqual(['pt', 'co']);
    expect(materialsIn(other)).toEqual(['pt-new', 'co']);
    expect(JSON.stringify(other).match(/"material":"pt-new","version":4/g)).toHaveLength(4);
    expect(stackDocumentSchema.safeParse(other).success).toBe(true);
  });

  it('leaves the film as it was', () => {
    const before = JSON.stringify(film);
    exchangeMaterial(film, ['pt', 'co'], { material: 'x', version: 1 });
    expect(JSON.stringify(film)).toBe(before);
  });
});

describe('commonRangeNm', () => {
  const library = (voigtRangeNm: [number, number]) =>
    new Map([
      ['pt', buildSummary('pt', { rangeNm: [250, 2000] })],
      ['co', buildSummary('co', { rangeNm: [188, 900], voigtRangeNm })],
    ]);

  it('is where all n and k are known; a Q used everywhere asks for nothing', () => {
    expect(commonRangeNm(film, library([632.8, 632.8]), [100, 9000])).toEqual([250, 900]);
  });

  it('ends where the Q of a magnetized layer ends', () => {
    expect(commonRangeNm(film, library([400, 700]), [100, 9000])).toEqual([400, 700]);
  });

  it('is null where the materials have no wavelength in common', () => {
    const other = exchangeMaterial(film, ['pt'], { material: 'far', version: 1 });
    const far = buildSummary('far', { rangeNm: [3000, 4000] });
    expect(commonRangeNm(other, new Map([...library([400, 700]), ['far', far]]), [100, 9000])).toBeNull();
  });
});
