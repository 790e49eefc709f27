import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readingNames } from '../../shared/run.ts';
import type { StackItem } from '../../shared/stack.ts';
import { planChunks } from './planChunks.ts';
import type { SweepInput } from './sweepInput.ts';

const film: StackItem = { id: 'a', medium: { index: [2.25, 4.07] }, thicknessNm: 1 };

function sweepOf(
  points: number,
  layers: StackItem[] = [film],
  kind: 'angle' | 'wavelength' = 'angle',
): SweepInput {
  return {
    document: {
      incident: { index: 1 },
      layers,
      substrate: { index: [3.88, 0.02] },
      workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
    },
    axis:
      kind === 'angle'
        ? { kind, from: 0, to: 80, points, spacing: 'linear' }
        : { kind, from: 400, to: 800, points, spacing: 'linear' },
    readings: [...readingNames],
    materials: [],
  };
}

describe('planChunks', () => {
  it('covers every point once and in order, whatever the size', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1_000_000 }),
        fc.integer({ min: 1, max: 64 }),
        fc.integer({ min: 0, max: 60 }),
        (points, threads, layers) => {
          const items = Array.from({ length: layers }, (_, index) => ({ ...film, id: String(index) }));
          let next = 0;
          for (const chunk of planChunks(sweepOf(points, items), threads)) {
            if (chunk.start !== next || chunk.count < 1) throw new Error(`gap or empty chunk at ${next}`);
            next += chunk.count;
          }
          expect(next).toBe(points);
        },
      ),
      { numRuns: 50 },
    );
  });

  it('occupies every thread of a machine with a sweep of usual size', () => {
    expect(planChunks(sweepOf(2_000), 2).length).toBeGreaterThanOrEqual(8);
    expect(planChunks(sweepOf(2_000), 8).length).toBeGreaterThanOrEqual(32);
  });

  it('does not cut a small sweep into crumbs', () => {
    expect(planChunks(sweepOf(20), 8)).toEqual([{ start: 0, count: 20 }]);
  });

  it('makes chunks smaller where a point costs more', () => {
    const thick = Array.from({ length: 2_000 }, (_, index) => ({ ...film, id: String(index) }));
    const [few] = planChunks(sweepOf(1_000_000, [film]), 2);
    const [many] = planChunks(sweepOf(1_000_000, thick), 2);
    expect(many!.count).toBeLessThan(few!.count / 100);
  });

  it('holds the constants of few wavelengths at a time in a stack of many layers', () => {
    const thick = Array.from({ length: 2_000 }, (_, index) => ({ ...film, id: String(index) }));
    const chunks = planChunks(sweepOf(1_000_000, thick, 'wavelength'), 2);
    const largest = chunks.reduce((most, { count }) => Math.max(most, count), 0);
    expect(largest * 2_002).toBeLessThanOrEqual(200_000);
  });
});
