import { writeFile, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { SLOW_MS, angles, designs, endless, failureOf, request, sweepOf } from '../tests/poolQuestions.ts';
import { createPool } from './pool.ts';
import type { ComputePool } from './pool.ts';

describe('a pool whose thread dies', () => {
  let folder: string;
  let pool: ComputePool;
  beforeAll(async () => {
    // The real task, except that some inputs end or break the thread that gets them.
    folder = await mkdtemp(path.join(tmpdir(), 'skewlight-pool-'));
    const file = path.join(folder, 'task.mjs');
    const real = new URL('./task.ts', import.meta.url).href;
    await writeFile(
      file,
      `import * as real from ${JSON.stringify(real)};
       export const warm = real.warm;
       export const sweepChunk = (task) => {
         if (task.points === 777) process.exit(9);
         if (task.points === 778) throw new Error('a bug');
         if (task.points === 779) { const hoard = []; for (;;) hoard.push(new Array(1_000).fill(hoard.length)); }
         return real.sweepChunk(task);
       };
       export const designStep = (task) => {
         const { design } = JSON.parse(new TextDecoder().decode(new Uint8Array(task.work).slice()));
         const seed = design.seed ?? design.tolerance.seed;
         if (seed === 777) process.exit(9);
         if (seed === 778) throw new Error('a bug');
         if (seed === 779) { const hoard = []; for (;;) hoard.push(new Array(1_000).fill(hoard.length)); }
         return real.designStep(task);
       };
       export const solve = (request) => (request.cases.length === 0 ? process.exit(9) : real.solve(request));`,
    );
    pool = createPool({ threads: 2, taskFile: pathToFileURL(file), heapMb: 100 });
    await pool.warm();
  }, SLOW_MS);
  afterAll(async () => {
    await pool.close();
    await rm(folder, { recursive: true });
  });

  it.each([
    ['exits', 777, /exited with code: 9/],
    ['throws', 778, /a bug/],
    ['runs out of memory', 779, /memory/],
  ])('fails its sweep clearly when it %s, and the pool lives on', async (_how, points, message) => {
    const failure = await failureOf(pool.sweep(sweepOf(angles(points))));
    expect(failure.failure).toBe('crashed');
    expect(failure.message).toMatch(message);
    const { columns } = await pool.sweep(sweepOf(angles(1_000)));
    expect(columns[1]!.every(Number.isFinite)).toBe(true);
    expect(pool.state().ok).toBe(true);
  });

  it.each([
    ['tolerance', 777, /exited with code: 9/],
    ['cap', 778, /a bug/],
    ['optimise', 779, /memory/],
  ] as const)('fails a design of kind %s the same way, and answers the next', async (kind, seed, message) => {
    const failure = await failureOf(pool.design({ design: designs[kind](seed), materials: [] }));
    expect(failure.failure).toBe('crashed');
    expect(failure.message).toMatch(message);
    const { result } = await pool.design({ design: designs[kind](3), materials: [] });
    expect(result.kind).toBe(kind);
    expect(pool.state().ok).toBe(true);
  });

  it('fails a small request the same way', async () => {
    expect((await failureOf(pool.solve({ cases: [] }))).failure).toBe('crashed');
    expect((await pool.solve(request)).results).toHaveLength(1);
  });

  it('fails what is under way when it closes', async () => {
    const closing = createPool({ threads: 1 });
    await closing.warm();
    const failure = failureOf(closing.sweep(endless));
    await sleep(100);
    await closing.close();
    expect((await failure).failure).toBe('closed');
    expect((await failureOf(closing.solve(request))).failure).toBe('closed');
  });
});
