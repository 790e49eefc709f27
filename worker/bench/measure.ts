import { once } from 'node:events';
import { setTimeout as sleep } from 'node:timers/promises';
import { Worker } from 'node:worker_threads';
import { BatchResult } from '../optics/fast/batchResult.ts';
import type { BenchTask } from './benchThread.ts';
import type { Workload } from './workloads.ts';
import { pointsOf } from './workloads.ts';

const WARM_UP_MS = 1_000;
const WINDOW_MS = 2_000;
const WINDOWS = 5;

/** Makes a thread load TypeScript; preloading tsx itself registers it in the main thread only. */
const TYPESCRIPT = `data:text/javascript,import { register } from ${JSON.stringify(import.meta.resolve('tsx/esm/api'))}; register();`;

/** Points solved so far by all threads. */
const solved = (shared: BigInt64Array) => Number(Atomics.load(shared, 1));

/**
 * Points per second of `threads` threads that fill one result together: the median of five windows of two seconds
 * after a warm-up.
 */
export async function pointsPerSecond(workload: Workload, threads: number): Promise<number> {
  const control = new SharedArrayBuffer(24);
  const shared = new BigInt64Array(control);
  const result = new SharedArrayBuffer(BatchResult.bytes(pointsOf(workload).anglesDeg.length));
  const task: BenchTask = { workload: workload.name, control, result };
  const workers = Array.from(
    { length: threads },
    () =>
      new Worker(new URL('./benchThread.ts', import.meta.url), {
        workerData: task,
        execArgv: ['--import', TYPESCRIPT],
      }),
  );
  const failure = Promise.race(
    workers.map(async (worker) => {
      const [error] = (await once(worker, 'error')) as [Error];
      throw error;
    }),
  );
  try {
    return await Promise.race([failure, sampleRate(shared)]);
  } finally {
    Atomics.store(shared, 2, 1n);
    await Promise.allSettled(workers.map((worker) => worker.terminate()));
  }
}

async function sampleRate(shared: BigInt64Array): Promise<number> {
  while (solved(shared) === 0) await sleep(20);
  await sleep(WARM_UP_MS);
  const rates: number[] = [];
  for (let i = 0; i < WINDOWS; i++) {
    const before = solved(shared);
    const start = performance.now();
    await sleep(WINDOW_MS);
    rates.push(((solved(shared) - before) / (performance.now() - start)) * 1e3);
  }
  return rates.sort((a, b) => a - b)[Math.floor(WINDOWS / 2)]!;
}
