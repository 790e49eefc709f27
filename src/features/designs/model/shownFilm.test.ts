import { expect, it } from 'vitest';
import type { OptimiseDesign, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import { faintPoints, shownFilm } from './shownFilm.ts';

const readings = (reflectance: number) => ({
  ...{ rotationDeg: 0.1, ellipticityDeg: 0.2, amplitude: 0.01, contrast: null, reflectance },
  ceilingShare: null,
});
const at = (reflectance: number) => [{ pointId: 'a', readings: readings(reflectance) }];

const pareto = [
  { thicknessesNm: [1], first: 3, second: 2, points: at(0.5) },
  { thicknessesNm: [2], first: 2.9, second: 0.5, points: at(0.009) },
  { thicknessesNm: [3], first: 1, second: 0 },
];
const result: OptimiseResult = {
  ...{ kind: 'optimise', layerIds: ['cap'], path: [], evaluations: 9, ended: 'converged', seed: 1, pareto },
  start: { thicknessesNm: [4], value: 0.5 },
  best: { thicknessesNm: [1], value: 3, points: at(0.5), atBounds: [] },
};
const workingPoint: OptimiseDesign['points'][number]['workingPoint'] = {
  ...{ wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
};
const input: OptimiseDesign = {
  ...{ kind: 'optimise', effort: 'quick', seed: 1, variables: [], goal: { quantity: 'rotation' } },
  document: { incident: { index: 1 }, layers: [], substrate: { index: 2 }, workingPoint },
  points: [{ id: 'a', label: 'red', workingPoint }],
};

it('is the member that was chosen, with its own values and readings', () => {
  expect(shownFilm(result, 1)).toEqual({ name: 'compromise', member: 1, ...pareto[1] });
  const best = { ...pareto[0], name: 'best of the first goal', member: null };
  expect(shownFilm(result, null)).toEqual(best);
  expect(shownFilm(result, 0)).toEqual(best);
  expect(shownFilm(result, 99)).toEqual(best);
});

it('has no readings where the stored result holds none of that film', () => {
  expect(shownFilm(result, 2)).toMatchObject({ name: 'best of the second goal', points: [] });
  const { points } = shownFilm({ ...result, pareto: null }, 1);
  expect(points).toEqual(result.best.points);
});

it('hardly reflects at the working points where it reflects less than 1 %', () => {
  expect(faintPoints(input, shownFilm(result, 1))).toEqual([{ label: 'red', reflectance: 0.009 }]);
  expect(faintPoints(input, shownFilm(result, 0))).toEqual([]);
});
