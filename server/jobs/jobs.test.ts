import { fork } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';
import { pino } from 'pino';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { designResultSchema } from '../../shared/design.ts';
import type { SweepAxis } from '../../shared/run.ts';
import { decodeResult } from '../../shared/resultFormat.ts';
import { createPool } from '../../worker/pool.ts';
import type { ComputePool } from '../../worker/pool.ts';
import { readConfig } from '../config.ts';
import type { Jobs } from '../dependencies.ts';
import { createModels } from '../models/models.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { createMaterialStore } from '../services/materialStore.ts';
import { cancelRun } from '../services/runLifecycle.ts';
import { buildOptimiseInput, buildToleranceInput } from '../../tests/designInputs.ts';
import {
  buildDesign,
  buildGroup,
  buildRun,
  buildRunInput,
  buildUser,
  buildSlowDocument,
} from '../../tests/factories.ts';
import { waitForRun, waitLongForRun } from '../../tests/waitForRun.ts';
import { RunLease } from './runLease.ts';
import { RunQueue } from './runQueue.ts';
import { startJobs } from './start.ts';
import { sweepOrphans } from './sweeper.ts';

const logger = pino({ level: 'silent' });
const endless: SweepAxis = { kind: 'angle', from: 0, to: 89, points: 1_000_000, spacing: 'linear' };
const longer: SweepAxis = { kind: 'angle', from: 0, to: 89, points: 60_000, spacing: 'linear' };

let databaseUrl: string;
let models: Models;
let pool: ComputePool;
let queue: RunQueue;
const started: Jobs[] = [];

beforeAll(async () => {
  databaseUrl = process.env['TEST_DATABASE_URL']!;
  models = createModels(databaseUrl);
  pool = createPool({ threads: 2 });
  await pool.warm();
  queue = new RunQueue(models.sequelize);
  await queue.start();
  await emptyQueue();
});
afterEach(async () => {
  await Promise.all(started.splice(0).map((jobs) => jobs.stop()));
  // What a test left waiting must not be taken by the host of the next.
  await models.Run.update({ state: 'cancelled' }, { where: { state: ['queued', 'running'] } });
  await emptyQueue();
});
afterAll(async () => {
  await queue.stop();
  await pool.close();
  await models.sequelize.close();
});

async function emptyQueue(): Promise<void> {
  while ((await models.sequelize.transaction((transaction) => queue.take(transaction))) !== null);
}

async function startHost(compute: 'on' | 'off' = 'on'): Promise<Jobs> {
  const config = readConfig({ NODE_ENV: 'test', DATABASE_URL: databaseUrl, COMPUTE: compute });
  const jobs = await startJobs({ config, models, materials: createMaterialStore(models), logger, pool });
  started.push(jobs);
  return jobs;
}

/** A run in the queue. */
async function enqueued(axis: SweepAxis = longer): Promise<Run> {
  const group = await buildGroup(models);
  const run = await buildRun(models, group, {
    input: buildRunInput({ document: buildSlowDocument(), axis, readings: ['rotationP'] }),
  });
  await models.sequelize.transaction((transaction) => queue.send(run.id, transaction));
  return run;
}

/** A run whose host was killed without a word. */
async function orphaned(attempts: number, kind: 'sweep' | 'design' = 'sweep'): Promise<Run> {
  const group = await buildGroup(models);
  const run =
    kind === 'sweep'
      ? await buildRun(models, group, { state: 'running' })
      : await buildDesign(models, group, buildToleranceInput(), { state: 'running' });
  await run.update({
    host: 'killed',
    attempts,
    heartbeatAt: new Date(Date.now() - 60_000),
    startedAt: new Date(),
  });
  return run;
}

const hostOf = async (run: Run) => (await run.reload()).host;

describe('the queue', () => {
  it('gives a run to one host, and back when the taking is undone', async () => {
    const run = await enqueued();
    const undone = models.sequelize.transaction(async (transaction) => {
      expect(await queue.take(transaction)).toBe(run.id);
      // Another host looks meanwhile: the entry is not there for it.
      await models.sequelize.transaction(async (other) => expect(await queue.take(other)).toBeNull());
      throw new Error('killed');
    });
    await expect(undone).rejects.toThrow('killed');
    expect(await models.sequelize.transaction((transaction) => queue.take(transaction))).toBe(run.id);
    expect(await models.sequelize.transaction((transaction) => queue.take(transaction))).toBeNull();
  });

  it('has no entry of a run whose storing is undone', async () => {
    const group = await buildGroup(models);
    const run = await buildRun(models, group);
    const undone = models.sequelize.transaction(async (transaction) => {
      await queue.send(run.id, transaction);
      throw new Error('undone');
    });
    await expect(undone).rejects.toThrow('undone');
    expect(await models.sequelize.transaction((transaction) => queue.take(transaction))).toBeNull();
  });
});

describe('a compute host', () => {
  it('takes a waiting run at once, stores its numbers and says so', async () => {
    const jobs = await startHost();
    const states: string[] = [];
    const run = await enqueued({ ...longer, points: 2_000 });
    const stop = jobs.watch(run.id, (progress) => states.push(progress?.state ?? 'look'));
    const done = await waitForRun(models, run.id, 'done');
    await sleep(50);
    stop();
    expect(states.at(-1)).toBe('done');
    expect(done).toMatchObject({ done: 2_000, attempts: 1, error: null });
    const chunks = await models.RunChunk.findAll({ where: { runId: run.id }, order: ['position'] });
    const bytes = Buffer.concat(chunks.map((chunk) => chunk.bytes));
    const { axis, columns } = decodeResult(Uint8Array.from(bytes).buffer);
    expect(axis).toHaveLength(2_000);
    expect(columns.rotationP!.every(Number.isFinite)).toBe(true);
  });

  it('takes what waited before it started, and passes over what does not wait any more', async () => {
    const deleted = await enqueued();
    await deleted.destroy();
    const cancelled = await enqueued();
    await cancelled.update({ state: 'cancelled' });
    const waiting = await enqueued({ ...longer, points: 100 });
    await startHost();
    await waitForRun(models, waiting.id, 'done');
    expect((await cancelled.reload()).attempts).toBe(0);
  });

  it('stops a cancelled run within 100 ms', async () => {
    const jobs = await startHost();
    const user = await buildUser(models);
    const run = await enqueued(endless);
    await waitForRun(models, run.id, 'running');
    await sleep(200);
    expect((await jobs.health()).detail).toMatch(/1 runs/);
    await cancelRun(models, { userId: user.id, name: user.name }, run);
    const cancelled = performance.now();
    while (!(await jobs.health()).detail.includes('0 runs')) await sleep(2);
    expect(performance.now() - cancelled).toBeLessThan(100);
    expect((await run.reload()).state).toBe('cancelled');
  });

  it('gives its runs back when it stops, and another host brings them to their end', async () => {
    const first = await startHost();
    const run = await enqueued(longer);
    await waitForRun(models, run.id, 'running');
    const firstHost = await hostOf(run);
    await first.stop();
    await run.reload();
    expect(run).toMatchObject({ state: 'queued', host: null, attempts: 0 });
    await startHost();
    await waitForRun(models, run.id, 'done');
    expect(await hostOf(run)).not.toBe(firstHost);
  });

  it('shares the runs with another host, each run on one', async () => {
    await startHost();
    await startHost();
    const runs = await Promise.all(Array.from({ length: 12 }, () => enqueued({ ...longer, points: 4_000 })));
    for (const run of runs) await waitForRun(models, run.id, 'done');
    const hosts = new Set(await Promise.all(runs.map(hostOf)));
    expect(hosts.size).toBe(2);
    expect(runs.map(({ attempts }) => attempts)).toEqual(runs.map(() => 1));
  });

  it('leaves runs alone where COMPUTE is off', async () => {
    const jobs = await startHost('off');
    const run = await enqueued();
    await sleep(300);
    expect((await run.reload()).state).toBe('queued');
    expect(await jobs.health()).toMatchObject({ ok: true, detail: expect.stringMatching(/other/) as string });
  });

  it('fails a run that cannot be solved, with the reason', async () => {
    await startHost();
    const group = await buildGroup(models);
    const input = buildRunInput({ materials: [{ id: 'gone', version: 1 }] });
    const run = await buildRun(models, group, { input });
    await models.sequelize.transaction((transaction) => queue.send(run.id, transaction));
    const failed = await waitForRun(models, run.id, 'failed');
    expect(failed.error).toMatch(/material gone/);
    expect(failed.finishedAt).not.toBeNull();
  });

  it('keeps what a search had found when it fails or is cancelled, and nothing where another host has it', async () => {
    const group = await buildGroup(models);
    const found = Buffer.from('what there was');
    const take = async () => {
      const { id } = await buildDesign(models, group, buildOptimiseInput());
      return (await models.sequelize.transaction((one) => RunLease.take(models, id, 'host', one)))!;
    };
    const kept = async ({ runId }: RunLease) => {
      const chunks = await models.RunChunk.findAll({ where: { runId } });
      return chunks.map(({ bytes }) => bytes.toString());
    };
    const [failing, cancelled, lost] = [await take(), await take(), await take()];
    expect(await failing.fail('A thread ended.', found)).toBe(true);
    await models.Run.update({ state: 'cancelled' }, { where: { id: cancelled.runId } });
    expect(await cancelled.keep(found)).toBe(true);
    await models.Run.update({ state: 'cancelled', host: 'other' }, { where: { id: lost.runId } });
    expect(await lost.keep(found)).toBe(false);
    expect(await kept(failing)).toEqual(['what there was']);
    expect(await kept(cancelled)).toEqual(['what there was']);
    expect(await kept(lost)).toEqual([]);
  });

  it('comes back after the database cut all its connections', async () => {
    const jobs = await startHost();
    const run = await enqueued(longer);
    await waitForRun(models, run.id, 'running');
    const admin = new pg.Client(databaseUrl);
    await admin.connect();
    await admin.query(
      'SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = current_database() AND pid <> pg_backend_pid()',
    );
    await admin.end();
    // Questions of this test may fall on connections that were cut.
    await vi.waitFor(() => waitForRun(models, run.id, 'done'), { timeout: 20_000 });
    while (!(await jobs.health()).ok) await sleep(20);
    // It hears of new runs again.
    const next = await enqueued({ ...longer, points: 100 });
    await waitForRun(models, next.id, 'done');
  });
});

describe('the sweeper', () => {
  it('returns the run of a silent host to the queue, once', async () => {
    const run = await orphaned(1);
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 1, failed: 0 });
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 0, failed: 0 });
    expect((await run.reload()).state).toBe('queued');
    await startHost();
    expect(await waitForRun(models, run.id, 'done')).toMatchObject({ attempts: 2 });
  });

  it('returns a design question too, and it is answered', async () => {
    const run = await orphaned(1, 'design');
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 1, failed: 0 });
    await startHost();
    const done = await waitForRun(models, run.id, 'done');
    expect(done).toMatchObject({ attempts: 2, done: run.total });
    const chunks = await models.RunChunk.findAll({ where: { runId: run.id }, order: ['position'] });
    const text = Buffer.concat(chunks.map(({ bytes }) => bytes)).toString('utf8');
    expect(designResultSchema.parse(JSON.parse(text))).toMatchObject({ kind: 'tolerance', samples: 100 });
  });

  it('fails a run over which three hosts died, and says so', async () => {
    const run = await orphaned(3);
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 0, failed: 1 });
    expect((await run.reload()).state).toBe('failed');
    expect(run.error).toMatch(/this run stopped 3 times/);
    const design = await orphaned(3, 'design');
    await sweepOrphans({ models, queue, logger });
    expect((await design.reload()).error).toMatch(/this design stopped 3 times.*fewer samples/);
  });

  it('does not touch the run of a host that is alive', async () => {
    await startHost();
    const run = await enqueued(endless);
    await waitForRun(models, run.id, 'running');
    await sleep(2_500);
    expect(await sweepOrphans({ models, queue, logger }, 2)).toEqual({ returned: 0, failed: 0 });
    expect((await run.reload()).state).toBe('running');
  });

  it('gives a waiting run that lost its entry a new one', async () => {
    const group = await buildGroup(models);
    const run = await buildRun(models, group);
    await models.sequelize.query(`UPDATE runs SET updated_at = now() - interval '2 minutes' WHERE id = $1`, {
      bind: [run.id],
    });
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 1, failed: 0 });
    expect(await sweepOrphans({ models, queue, logger })).toEqual({ returned: 0, failed: 0 });
    await startHost();
    await waitForRun(models, run.id, 'done');
  });

  it('keeps the numbers of a host that comes back after its run was given away', async () => {
    // The host that was taken for dead finishes late: its numbers must not end up under the other's attempt.
    await startHost();
    const run = await enqueued(longer);
    await waitForRun(models, run.id, 'running');
    await run.update({ host: 'another', attempts: 2 });
    await sleep(2_000);
    expect((await run.reload()).state).toBe('running');
    expect(await models.RunChunk.count({ where: { runId: run.id } })).toBe(0);
  });
});

/** Processor time that a process uses meanwhile, by /proc: whether it still computes cannot be seen in the database. */
async function cpuSecondsWithin(pid: number, milliseconds: number): Promise<number> {
  const ticks = async () => {
    const stat = await readFile(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return Number(fields[11]) + Number(fields[12]);
  };
  const before = await ticks();
  await sleep(milliseconds);
  return ((await ticks()) - before) / 100;
}

describe('npm run compute', () => {
  it('takes runs from another process, cancels within a second, and gives back on SIGTERM', async () => {
    const jobs = await startHost('off');
    const child = fork(new URL('./compute.ts', import.meta.url), {
      execArgv: ['--import', 'tsx'],
      env: {
        ...process.env,
        NODE_ENV: 'production',
        DATABASE_URL: databaseUrl,
        THREADS: '1',
        LOG_LEVEL: 'silent',
      },
    });
    const ended = new Promise<number | null>((resolve) => child.once('exit', resolve));
    try {
      const user = await buildUser(models);
      const actor = { userId: user.id, name: user.name };
      const first = await enqueued({ ...longer, points: 1_000 });
      expect(await waitLongForRun(60_000, models, first.id, 'done')).toMatchObject({ attempts: 1 });
      const second = await enqueued(endless);
      await waitForRun(models, second.id, 'running');
      expect(await cpuSecondsWithin(child.pid!, 1_000)).toBeGreaterThan(0.05);
      await cancelRun(models, actor, second);
      await sleep(1_000);
      expect(await cpuSecondsWithin(child.pid!, 1_000)).toBeLessThan(0.05);
      const third = await enqueued(endless);
      await waitForRun(models, third.id, 'running');
      child.kill('SIGTERM');
      expect(await ended).toBe(0);
      expect(await third.reload()).toMatchObject({ state: 'queued', attempts: 0 });
      expect((await jobs.health()).ok).toBe(true);
    } finally {
      child.kill('SIGKILL');
    }
  }, 120_000);
});
