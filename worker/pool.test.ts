import { writeFile, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { MaterialContent } from '../shared/material.ts';
import type { SweepAxis } from '../shared/run.ts';
import type { SolveRequest } from '../shared/solve.ts';
import type { StackDocument, StackMedium } from '../shared/stack.ts';
import { toleranceDesignSchema } from '../shared/toleranceDesign.ts';
import type { DesignWork } from './design/designInput.ts';
import { solveRequest } from './optics/solveRequest.ts';
import { createPool } from './pool.ts';
import type { ComputePool } from './pool.ts';
import { ComputeError } from './sweep/computeError.ts';
import type { SweepInput } from './sweep/sweepInput.ts';

const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { index: [2.33, 4.14] }, thicknessNm: 3 },
    { id: 'film', medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] }, thicknessNm: 1, m: [0, 0, 1] },
    { id: 'buffer', medium: { index: [3.5, 3.6] }, thicknessNm: 5 },
  ],
  substrate: { index: [3.88, 0.02] },
  workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
};

const angles = (points: number): SweepAxis => ({ kind: 'angle', from: 0, to: 85, points, spacing: 'linear' });

const sweepOf = (axis: SweepAxis): SweepInput => ({
  document,
  axis,
  readings: ['rotationP', 'ellipticityP', 'contrastP', 'reflectanceS'],
  materials: [],
});

const designWork: DesignWork = {
  materials: [],
  design: toleranceDesignSchema.parse({
    kind: 'tolerance',
    document,
    points: [{ id: 'a', label: 'oblique', workingPoint: document.workingPoint }],
    signal: 'rotation',
    demands: { leastReflectance: 0.5 },
    tolerance: { ratePercent: 5, randomPercent: 2, samples: 450, seed: 3 },
  }),
};

const request: SolveRequest = {
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

/** Threads that translate TypeScript start slowly on a busy machine. */
const SLOW_MS = 60_000;

const mixed: StackMedium = {
  mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ index: 1.5 }, { index: 2 }] },
};

/** A sweep that takes this machine some time. */
const endless: SweepInput = {
  ...sweepOf(angles(1_000_000)),
  document: {
    ...document,
    // A mixed layer: no fast path.
    layers: [...document.layers, { id: 'underlayer', medium: mixed, thicknessNm: 40 }],
  },
};

const madeUp = {
  citation: 'made up for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
} as const;

function failureOf(work: Promise<unknown>): Promise<ComputeError> {
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

  it('answers a design question alike on one and two threads', async () => {
    const alone = createPool({ threads: 1 });
    try {
      const [two, one] = await Promise.all([pool, alone].map((some) => some.design(designWork)));
      expect(one!.result).toEqual(two!.result);
      expect(one!.result).toMatchObject({ kind: 'tolerance', samples: 450 });
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
