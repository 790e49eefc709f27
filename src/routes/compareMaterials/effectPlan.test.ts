import { describe, expect, it } from 'vitest';
import { stackDocumentSchema } from '../../../shared/stack.ts';
import { buildMaterial, buildSummary } from '../../features/materials/materialFixtures.ts';
import { planEffect } from './effectPlan.ts';

// A capped magnet, no real sample; the plan is about wavelengths and ids, not about physics.
const film = stackDocumentSchema.parse({
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { material: 'pt', version: 1 }, thicknessNm: 3 },
    { id: 'co', medium: { material: 'co', assumeConstant: true }, thicknessNm: 1, m: [0, 0, 1] },
  ],
  substrate: { index: [3.9, 0.02] },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 30, input: 's', magnetization: { mode: 'drawn' } },
});
const library = [
  buildSummary('pt', { rangeNm: [250, 2000] }),
  buildSummary('co', { rangeNm: [188, 900], voigtRangeNm: [632.8, 632.8] }),
];
const a = buildMaterial({ id: 'pt', rangeNm: [250, 2000] });
const b = buildMaterial({ id: 'pt-new', version: 3, rangeNm: [300, 1000] });

describe('planEffect', () => {
  it('sweeps where all constants of both films are known, the working point included', () => {
    const plan = planEffect(film, ['pt'], a, b, library);
    const grid = plan?.sweep.grid ?? [];
    expect([grid[0], grid.at(-1)]).toEqual([300, 900]);
    expect(grid).toHaveLength(121);
    expect(grid).toContain(632.8);
    expect(plan?.sweep.readings).toEqual(['rotationS', 'ellipticityS']);
  });

  it('asks for either film in the version compared, as given and with m = 0', () => {
    const requests = planEffect(film, ['pt'], a, b, library)?.requests;
    expect(requests?.map(({ cases }) => cases.length)).toEqual([2, 2]);
    expect(requests?.[0].cases[0]?.layers[0]).toMatchObject({ material: 'pt', version: 1 });
    expect(requests?.[1].cases[1]?.layers[0]).toMatchObject({ material: 'pt-new', version: 3 });
  });

  it('takes the contrast for transverse m', () => {
    const { workingPoint } = film;
    const transverse = {
      ...film,
      workingPoint: {
        ...workingPoint,
        magnetization: { mode: 'direction' as const, m: [0, 1, 0] as [number, number, number] },
      },
    };
    expect(planEffect(transverse, ['pt'], a, b, library)?.sweep.readings).toEqual(['contrastS']);
  });

  it('is null where the two films have no wavelength in common', () => {
    const far = buildMaterial({ id: 'far', rangeNm: [950, 1000] });
    expect(planEffect(film, ['pt'], a, far, library)).toBeNull();
  });
});
