import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { MaterialContent } from '../shared/material.ts';
import {
  SLOW_MS,
  angles,
  designs,
  document,
  endless,
  failureOf,
  request,
  sweepOf,
} from '../tests/poolQuestions.ts';
import { solveRequest } from './optics/solveRequest.ts';
import { createPool } from './pool.ts';
import type { ComputePool } from './pool.ts';

const madeUp = {
  citation: 'made up for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
} as const;

describe('the pool', () => {
  let pool: ComputePool;
  beforeAll(async () => {
    pool = createPool({ threads: 2 });
    await pool.warm();
  }, SLOW_MS);
  afterAll(() => pool.close());

  it('answers a request with what the solver gives', async () => {
    expect(await pool.solve(request)).toEqual(solveRequest(request));
  });

  it('reports progress up to the end and fills every column', async () => {
    const seen: number[] = [];
    const { columns, points } = await pool.sweep(sweepOf(angles(50_000)), {
      onProgress: (done, total) => {
        expect(total).toBe(50_000);
        seen.push(done);
      },
    });
    expect(points).toBe(50_000);
    expect(columns).toHaveLength(4);
    expect(columns.every((column) => column.every(Number.isFinite))).toBe(true);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    expect(seen.at(-1)).toBe(50_000);
  });

  it('answers design questions of each kind alike on one and two threads, to the last bit', async () => {
    const alone = createPool({ threads: 1 });
    try {
      for (const ask of Object.values(designs)) {
        const answers = [pool, alone].map((some) => some.design({ design: ask(3), materials: [] }));
        const [two, one] = await Promise.all(answers);
        expect(one!.result).toStrictEqual(two!.result);
      }
    } finally {
      await alone.close();
    }
  });

  it('stops a running sweep within 100 ms and works on', async () => {
    const cancelling = new AbortController();
    const failure = failureOf(pool.sweep(endless, { signal: cancelling.signal }));
    await sleep(300);
    const asked = performance.now();
    cancelling.abort();
    expect((await failure).failure).toBe('cancelled');
    expect(performance.now() - asked).toBeLessThan(100);
    // The threads are free again, not busy with a sweep that nobody wants.
    const next = performance.now();
    await pool.sweep(sweepOf(angles(100)));
    expect(performance.now() - next).toBeLessThan(1_000);
  });

  it('refuses a sweep that is cancelled before it starts', async () => {
    const failure = await failureOf(pool.sweep(endless, { signal: AbortSignal.abort() }));
    expect(failure.failure).toBe('cancelled');
  });

  it('keeps this process and small requests quick while a sweep holds every core', async () => {
    const cancelling = new AbortController();
    const sweep = failureOf(pool.sweep(endless, { signal: cancelling.signal }));
    await sleep(100);
    const waits: number[] = [];
    const turns: number[] = [];
    for (let count = 0; count < 20; count += 1) {
      const asked = performance.now();
      await pool.solve(request);
      waits.push(performance.now() - asked);
      const turn = performance.now();
      await sleep(5);
      turns.push(performance.now() - turn);
    }
    cancelling.abort();
    await sweep;
    const median = waits.sort((a, b) => a - b)[10]!;
    expect(median).toBeLessThan(50);
    expect(Math.max(...turns)).toBeLessThan(100);
  });

  it('lets two sweeps share the cores, so that a short one does not wait for a long one', async () => {
    const cancelling = new AbortController();
    const long = failureOf(pool.sweep(endless, { signal: cancelling.signal }));
    await sleep(100);
    const started = performance.now();
    await pool.sweep(sweepOf(angles(2_000)));
    expect(performance.now() - started).toBeLessThan(2_000);
    cancelling.abort();
    await long;
  });

  it('reads a table, tells how far it is, and converts it', async () => {
    const rows = Array.from({ length: 60_000 }, (_, i) => `${400 + i / 100};${2 + i / 1e5};3`);
    const bytes = new TextEncoder().encode(`nm;n;k\n${rows.join('\n')}\n`);
    const seen: number[] = [];
    const { table, exported } = await pool.readTable(bytes, { onProgress: (part) => seen.push(part) });
    expect([table.rowCount, exported]).toEqual([60_000, null]);
    expect(seen.length).toBeGreaterThan(1);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    expect(seen.at(-1)).toBe(1);
    const { index } = await pool.convertTable(bytes, table.suggestion!, null);
    expect([index!.wavelengthsNm[100], index!.n[100], index!.k[100]]).toEqual([401, 2.001, 3]);
  });

  it('refuses what is no table, and a mapping that does not fit, with their own words', async () => {
    const bytes = new TextEncoder().encode('nm,n,k\n400,1,-2\n');
    const refused = await failureOf(pool.readTable(bytes.slice(0, 6)));
    expect([refused.failure, refused.message]).toEqual([
      'refused',
      expect.stringMatching(/No row of numbers/),
    ]);
    const { table } = await pool.readTable(bytes);
    const failure = await failureOf(pool.convertTable(bytes, table.suggestion!, null));
    expect(failure.failure).toBe('refused');
    expect(failure.issues.map(({ path }) => path)).toEqual(['habits.time']);
  });

  it('stops reading when it is cancelled, and reads the next', async () => {
    const bytes = new TextEncoder().encode('400,1,2\n'.repeat(190_000));
    const cancelling = new AbortController();
    const failure = failureOf(pool.readTable(bytes, { signal: cancelling.signal }));
    await sleep(20);
    cancelling.abort();
    expect((await failure).failure).toBe('cancelled');
    expect((await pool.readTable(new TextEncoder().encode('400,1\n500,2'))).table.rowCount).toBe(2);
  });

  it('gives curves, issues and resolved cases of constants, and says in which case a material is missing', async () => {
    const content: MaterialContent = {
      index: { kind: 'table', wavelengthsNm: [400, 800], n: [1, 3], k: [0, 0] },
      indexSource: madeUp,
      voigt: null,
      voigtSource: null,
    };
    expect((await pool.curves(content)).n[0]).toBe(1);
    expect(await pool.checkContent(content)).toEqual([]);
    const falling = { ...content, index: { ...content.index, wavelengthsNm: [800, 400] } } as MaterialContent;
    expect((await pool.checkContent(falling)).map(({ path }) => path)).toEqual(['index.wavelengthsNm[1]']);
    const materials = new Map([['x@1', { id: 'x', version: 1, name: 'Testium', content }]]);
    const caseOf = (material: string) => ({
      ...request.cases[0]!,
      wavelengthNm: 800,
      substrate: { material },
    });
    const [resolved] = await pool.resolve([caseOf('x')], materials);
    expect(resolved!.substrate.index).toEqual([3, 0]);
    const failure = await failureOf(pool.resolve([caseOf('x'), caseOf('y')], materials));
    expect(failure.issues.map(({ path }) => path)).toEqual(['cases[1].substrate.material']);
  });

  it('says which material does not reach to a wavelength of the sweep', async () => {
    const film = { id: 'film', medium: { material: 'x', version: 1 }, thicknessNm: 1 };
    const failure = await failureOf(
      pool.sweep({
        document: { ...document, layers: [film] },
        axis: { kind: 'wavelength', from: 500, to: 900, points: 200, spacing: 'linear' },
        readings: ['reflectanceP'],
        materials: [
          {
            id: 'x',
            version: 1,
            name: 'Testium',
            content: {
              index: { kind: 'table', wavelengthsNm: [400, 600, 800], n: [1, 2, 3], k: [0, 0, 0] },
              indexSource: madeUp,
              voigt: null,
              voigtSource: null,
            },
          },
        ],
      }),
    );
    expect(failure.failure).toBe('refused');
    expect(failure.issues[0]!.path).toBe('layers[0].material');
    expect(failure.issues[0]!.message).toMatch(/Testium.*400 to 800 nm/);
  });
});
