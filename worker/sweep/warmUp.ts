import type { SweepAxis } from '../../shared/run.ts';
import { readingNames } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { SharedResult } from './sharedResult.ts';
import { SweepSolver } from './sweepSolver.ts';

/** Enough for the engine to compile the inner loops; some 50 ms. */
const POINTS = 400;

/** Solves a small sweep of each kind, so that the first one of a person runs as fast as the next. */
export function warmUp(): void {
  const span = { points: POINTS, spacing: 'linear' } as const;
  const axes: SweepAxis[] = [
    { kind: 'wavelength', from: 400, to: 800, ...span },
    { kind: 'angle', from: 0, to: 85, ...span },
    { kind: 'thickness', layerId: 'film', from: 0, to: 20, ...span },
  ];
  for (const axis of axes) {
    const solver = new SweepSolver({ document, axis, readings: [...readingNames], materials: [] });
    const chunk = {
      first: { start: 0, count: POINTS },
      second: { start: 0, stride: 1, count: 1 },
      family: 0,
    };
    solver.solve(chunk, SharedResult.allocate(POINTS, readingNames.length));
  }
}

const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { index: [2.3, 4.1] }, thicknessNm: 2 },
    { id: 'film', medium: { index: [2.2, 4], voigt: [0.03, 0.01] }, thicknessNm: 5, m: [0.1, 0.2, 0.9] },
    { id: 'oxide', medium: { index: 1.46 }, thicknessNm: 100 },
  ],
  substrate: { index: [3.9, 0.02] },
  workingPoint: { wavelengthNm: 633, angleDeg: 45, input: 'p', magnetization: { mode: 'drawn' } },
};
