import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readingNames } from '../../shared/run.ts';
import type { SweepAxis } from '../../shared/run.ts';
import type { StackItem } from '../../shared/stack.ts';
import type { Chunk } from './planChunks.ts';
import { chunkPoints, planChunks } from './planChunks.ts';
import type { SweepInput } from './sweepInput.ts';

const film: StackItem = { id: 'a', medium: { index: [2.25, 4.07] }, thicknessNm: 1 };
const layersOf = (count: number): StackItem[] =>
  Array.from({ length: count }, (_, index) => ({ ...film, id: String(index) }));

const angles = (points: number): SweepAxis => ({ kind: 'angle', from: 0, to: 80, points, spacing: 'linear' });
const wavelengths = (points: number): SweepAxis => ({
  kind: 'wavelength',
  from: 400,
  to: 800,
  points,
  spacing: 'linear',
});

function sweepOf(axis: SweepAxis, layers: StackItem[] = [film], more: Partial<SweepInput> = {}): SweepInput {
  return {
    document: {
      incident: { index: 1 },
      layers,
      substrate: { index: [3.88, 0.02] },
      workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
    },
    axis,
    readings: [...readingNames],
    materials: [],
    ...more,
  };
}

/** Counts how often each point is in a chunk. */
function coverage(chunks: Chunk[], firsts: number, seconds: number, families: number): Uint8Array {
  const seen = new Uint8Array(firsts * seconds * families);
  for (const { first, second, family } of chunks) {
    if (first.count < 1 || second.count < 1) throw new Error('empty chunk');
    for (let s = 0; s < second.count; s += 1) {
      const row = family * seconds + second.start + s * second.stride;
      for (let f = 0; f < first.count; f += 1) {
        const index = row * firsts + first.start + f;
        seen[index] = seen[index]! + 1;
      }
    }
  }
  return seen;
}

describe('planChunks', () => {
  it('covers every point once, whatever the size', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 3_000 }),
        fc.integer({ min: 1, max: 300 }),
        fc.integer({ min: 2, max: 12 }),
        fc.boolean(),
        fc.integer({ min: 1, max: 64 }),
        fc.integer({ min: 0, max: 60 }),
        (firsts, seconds, families, isFamily, threads, layers) => {
          const family: SweepAxis = { ...angles(families), kind: 'voigtScale' };
          const input = sweepOf(wavelengths(firsts), layersOf(layers), {
            ...(seconds > 1 ? { second: angles(seconds) } : {}),
            ...(isFamily ? { family } : {}),
          });
          const seen = coverage(planChunks(input, threads), firsts, seconds, isFamily ? families : 1);
          expect(seen.every((count) => count === 1)).toBe(true);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('occupies every thread of a machine with a sweep of usual size', () => {
    expect(planChunks(sweepOf(angles(2_000)), 2).length).toBeGreaterThanOrEqual(8);
    expect(planChunks(sweepOf(angles(2_000)), 8).length).toBeGreaterThanOrEqual(32);
  });

  it('does not cut a small sweep into crumbs', () => {
    expect(planChunks(sweepOf(angles(20)), 8)).toEqual([
      { first: { start: 0, count: 20 }, second: { start: 0, stride: 1, count: 1 }, family: 0 },
    ]);
  });

  it('makes chunks smaller where a point costs more', () => {
    const [few] = planChunks(sweepOf(angles(1_000_000), [film]), 2);
    const [many] = planChunks(sweepOf(angles(1_000_000), layersOf(2_000)), 2);
    expect(chunkPoints(many!)).toBeLessThan(chunkPoints(few!) / 100);
  });

  it('holds the constants of few wavelengths at a time in a stack of many layers', () => {
    for (const input of [
      sweepOf(wavelengths(1_000_000), layersOf(2_000)),
      sweepOf(angles(1_000), layersOf(2_000), { second: wavelengths(1_000) }),
    ]) {
      const held = planChunks(input, 2).map(({ first, second }) => (input.second ? second : first).count);
      expect(held.reduce((most, count) => Math.max(most, count), 0) * 2_002).toBeLessThanOrEqual(200_000);
    }
  });

  it('shows all of a map coarsely before it shows any of it finely', () => {
    const input = sweepOf(wavelengths(1_000), [film], {
      second: angles(1_000),
      readings: ['rotationP'],
    });
    const chunks = planChunks(input, 2);
    expect(chunks.length).toBeGreaterThanOrEqual(8);
    const rows = chunks
      .slice(0, 2)
      .flatMap(({ second }) =>
        Array.from({ length: second.count }, (_, i) => second.start + i * second.stride),
      )
      .sort((a, b) => a - b);
    const gaps = rows.slice(1).map((row, i) => row - rows[i]!);
    expect(rows[0]).toBe(0);
    expect(rows.at(-1)).toBeGreaterThanOrEqual(1_000 - chunks[0]!.second.stride);
    expect(Math.max(...gaps)).toBeLessThanOrEqual(chunks[0]!.second.stride);
  });
});
