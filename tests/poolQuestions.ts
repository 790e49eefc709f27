import { designInputSchema } from '../shared/design.ts';
import type { SweepAxis } from '../shared/run.ts';
import type { SolveRequest } from '../shared/solve.ts';
import type { StackDocument, StackMedium } from '../shared/stack.ts';
import { ComputeError } from '../worker/sweep/computeError.ts';
import type { SweepInput } from '../worker/sweep/sweepInput.ts';

/** What tests of the pool ask it: questions of each kind about Pt 3 / Co 1 / Pt 5 on silicon. */

/** Threads that translate TypeScript start slowly on a busy machine. */
export const SLOW_MS = 60_000;

export const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { index: [2.33, 4.14] }, thicknessNm: 3 },
    { id: 'film', medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] }, thicknessNm: 1, m: [0, 0, 1] },
    { id: 'buffer', medium: { index: [3.5, 3.6] }, thicknessNm: 5 },
  ],
  substrate: { index: [3.88, 0.02] },
  workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
};

export const angles = (points: number): SweepAxis => ({
  kind: 'angle',
  from: 0,
  to: 85,
  points,
  spacing: 'linear',
});

export const sweepOf = (axis: SweepAxis): SweepInput => ({
  document,
  axis,
  readings: ['rotationP', 'ellipticityP', 'contrastP', 'reflectanceS'],
  materials: [],
});

const points = [{ id: 'a', label: 'oblique', workingPoint: document.workingPoint }];

/** A quick question of each kind, by its seed. */
export const designs = {
  tolerance: (seed: number) =>
    designInputSchema.parse({
      kind: 'tolerance',
      document,
      points,
      signal: 'rotation',
      demands: { leastReflectance: 0.5 },
      tolerance: { ratePercent: 5, randomPercent: 2, samples: 450, seed },
    }),
  cap: (seed: number) =>
    designInputSchema.parse({
      kind: 'cap',
      document,
      replaces: ['cap'],
      candidates: [1.5, [2.33, 4.14]].map((index, number) => ({
        id: String(number),
        label: `cap ${number}`,
        layers: [{ medium: { index }, leastNm: 1, leastSource: 'made up', fixedNm: null }],
      })),
      range: { fromNm: 0, toNm: 6, points: 13 },
      points,
      signal: 'rotation',
      demands: { leastReflectance: 0.5 },
      tolerance: { ratePercent: 5, randomPercent: 2, samples: 130, seed },
      leastYield: 0.5,
    }),
  optimise: (seed: number) =>
    designInputSchema.parse({
      kind: 'optimise',
      document,
      variables: ['cap', 'buffer'].map((layerId) => ({ layerId, fromNm: 0, toNm: 20 })),
      points,
      goal: { quantity: 'rotation' },
      effort: 'quick',
      seed,
    }),
};

export const request: SolveRequest = {
  cases: [
    {
      wavelengthNm: 633,
      angleDeg: [0, 30],
      incident: { index: 1 },
      layers: [{ index: [2.25, 4.07], voigt: [0.03, 0.01], m: [0, 0, 1], thicknessNm: 5 }],
      substrate: { index: [3.88, 0.02] },
    },
  ],
};

const mixed: StackMedium = {
  mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ index: 1.5 }, { index: 2 }] },
};

/** A sweep that takes this machine some time. */
export const endless: SweepInput = {
  ...sweepOf(angles(1_000_000)),
  document: {
    ...document,
    // A mixed layer: no fast path.
    layers: [...document.layers, { id: 'underlayer', medium: mixed, thicknessNm: 40 }],
  },
};

/** What a question was refused or lost with. */
export function failureOf(work: Promise<unknown>): Promise<ComputeError> {
  return work.then(
    () => {
      throw new Error('expected a ComputeError');
    },
    (error: unknown) => {
      if (error instanceof ComputeError) return error;
      throw error;
    },
  );
}
