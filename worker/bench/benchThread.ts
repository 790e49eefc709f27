import { workerData } from 'node:worker_threads';
import { loadKernel } from '../kernel/loadKernel.ts';
import { BatchResult } from '../optics/fast/batchResult.ts';
import { FastSolver } from '../optics/fast/fastSolver.ts';
import { pointsOf, WORKLOADS } from './workloads.ts';

/** What a thread of the bench shares with the others. */
export type BenchTask = {
  workload: string;
  /** Next chunk, points solved, stop flag. */
  control: SharedArrayBuffer;
  /** Columns of a BatchResult for all points of the workload. */
  result: SharedArrayBuffer;
};

/** Points that a thread takes at a time. */
const CHUNK = 2_000;

/** Solves chunk after chunk of one workload, over and over, until told to stop. */
function work({ workload: name, control, result }: BenchTask): void {
  const workload = WORKLOADS.find((one) => one.name === name);
  if (!workload) throw new Error(`no workload ${name}`);
  const shared = new BigInt64Array(control);
  const all = pointsOf(workload);
  const points = all.anglesDeg.length;
  const out = new BatchResult(points, false, result);
  const solver = new FastSolver(workload.solveCase, loadKernel());
  const chunks = Array.from({ length: Math.ceil(points / CHUNK) }, (_, i) => ({
    start: i * CHUNK,
    batch: {
      wavelengthIndex: all.wavelengthIndex.subarray(i * CHUNK, (i + 1) * CHUNK),
      anglesDeg: all.anglesDeg.subarray(i * CHUNK, (i + 1) * CHUNK),
    },
  }));
  while (Atomics.load(shared, 2) === 0n) {
    const { start, batch } = chunks[Number(Atomics.add(shared, 0, 1n) % BigInt(chunks.length))]!;
    solver.solveBatch(batch, out, start);
    Atomics.add(shared, 1, BigInt(batch.anglesDeg.length));
  }
}

// Written by measure.ts.
work(workerData as BenchTask);
