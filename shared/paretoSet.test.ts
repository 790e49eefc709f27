import { expect, it } from 'vitest';
import { designResultSchema } from './design.ts';
import { paretoRoles } from './paretoSet.ts';

it('names both ends of a set and the film nearest to both bests, each scaled to its range', () => {
  // By hand: from the bests (10, 0), as shares of 8 and 400, the distances are 1, 0.613, 0.559 and 1.
  const pareto = [
    { first: 10, second: 400 },
    { first: 9, second: 240 },
    { first: 8, second: 200 },
    { first: 2, second: 0 },
  ];
  expect([...paretoRoles(pareto)]).toEqual([
    [0, 'best first'],
    [3, 'best second'],
    [2, 'compromise'],
  ]);
  // The unit of a goal does not matter, nor whether it is to become greater.
  expect(paretoRoles(pareto.map(({ first, second }) => ({ first: -first, second: second / 1000 })))).toEqual(
    paretoRoles(pareto),
  );
});

it('names no compromise where nothing lies between the ends, and nothing where one film is the best of both', () => {
  const two = [
    { first: 2, second: 1 },
    { first: 1, second: 0 },
  ];
  expect([...paretoRoles(two).values()]).toEqual(['best first', 'best second']);
  expect(paretoRoles(two.slice(1)).size).toBe(0);
});

it('reads results that were stored before films of a set had readings', () => {
  const film = { thicknessesNm: [3], first: 0.1, second: 0.2 };
  const stored = {
    kind: 'optimise',
    layerIds: ['cap'],
    start: { thicknessesNm: [2], value: 0.05 },
    best: { thicknessesNm: [3], value: 0.1, points: [], atBounds: [] },
    path: [],
    evaluations: 1,
    ended: 'budget',
    pareto: [film],
    seed: 1,
  };
  expect(designResultSchema.parse(stored)).toEqual(stored);
});
