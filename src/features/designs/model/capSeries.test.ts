import { expect, it } from 'vitest';
import type { CapDesign, CapPointCurves, CapResult } from '../../../../shared/capDesign.ts';
import { capSeries } from './capSeries.ts';

// Invented numbers: what is checked is which of them is drawn, and in which unit.
const x = [0, 1, 2];
const point: CapPointCurves = {
  pointId: 'point',
  rotationDeg: [-0.08, -0.07, null],
  ellipticityDeg: [0, 0, 0],
  amplitude: [0, 0, 0],
  contrast: [null, null, null],
  reflectance: [0.4, 0.5, 0.6],
  ceilingShare: [0.1, 0.1, 0.1],
  signal: [0.08, 0.07, null],
  signalLow: [0.07, 0.06, null],
  signalMedian: [0.08, 0.07, null],
  signalHigh: [0.09, 0.08, null],
  slopePercentPerNm: [-1, -1, null],
  costPercent: [0, 12, null],
};
const input: CapDesign = {
  kind: 'cap',
  document: {
    incident: { index: 1 },
    layers: [],
    substrate: { index: 2 },
    workingPoint: { wavelengthNm: 600, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
  },
  replaces: [],
  candidates: [],
  range: { fromNm: 0, toNm: 2, points: 3 },
  points: [],
  signal: 'rotation',
  demands: {},
  tolerance: {
    ratePercent: 5,
    randomPercent: 2,
    indexPercent: 0,
    voigtPercent: 0,
    materials: [],
    samples: 100,
    seed: 1,
  },
  leastYield: 0.9,
};
const outcome = {
  points: [point],
  yield: [1, 1, 0],
  windows: [],
  robustWindows: [],
  best: null,
  obstacle: null,
};
const result: CapResult = {
  kind: 'cap',
  thicknessNm: x,
  bare: [
    {
      pointId: 'point',
      signal: 0.085,
      readings: {
        rotationDeg: -0.085,
        ellipticityDeg: 0,
        amplitude: 0,
        contrast: null,
        reflectance: 0.35,
        ceilingShare: null,
      },
    },
  ],
  candidates: [
    { id: 'a', label: 'Pt', ...outcome },
    { id: 'b', label: 'Au', ...outcome },
  ],
  ranking: ['a', 'b'],
  samples: 100,
  seed: 1,
};

it('draws the signal in mdeg with its band, a gap where there is none, and the film without a cap', () => {
  const [first, second, bare] = capSeries(input, result, 'point', 'signal');
  expect(first?.name).toBe('Pt');
  expect(Array.from(first?.y ?? [])).toEqual([80, 70, NaN]);
  expect(Array.from(first?.band?.low ?? [])).toEqual([70, 60, NaN]);
  expect(Array.from(first?.band?.high ?? [])).toEqual([90, 80, NaN]);
  expect(second?.dash).not.toBe(first?.dash);
  expect(bare?.name).toBe('no cap');
  expect(Array.from(bare?.y ?? [])).toEqual([85, 85, 85]);
});

it('has no band and no reference for what is told of a cap only', () => {
  const cost = capSeries(input, result, 'point', 'costPercent');
  expect(cost.map(({ name }) => name)).toEqual(['Pt', 'Au']);
  expect(cost[0]?.band).toBeUndefined();
  expect(capSeries(input, result, 'point', 'reflectance').map(({ name }) => name)).toContain('no cap');
  expect(Array.from(capSeries(input, result, 'point', 'yield')[0]?.y ?? [])).toEqual([100, 100, 0]);
});
