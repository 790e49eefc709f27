import { availableParallelism } from 'node:os';
import type { SolveRequest, SolveResponse } from '../shared/solve.ts';
import { designPool } from './designPool.ts';
import type { DesignPool } from './designPool.ts';
import { livePool } from './livePool.ts';
import type { LivePool } from './livePool.ts';
import { materialPool } from './materialPool.ts';
import type { MaterialPool } from './materialPool.ts';
import { runLimited } from './runLimited.ts';
import { microsecondsOf } from './sweep/cost.ts';
import { runSweep } from './sweep/runSweep.ts';
import type { SweepOptions, SweepResult } from './sweep/runSweep.ts';
import type { SweepInput } from './sweep/sweepInput.ts';
import { Threads } from './sweep/threads.ts';

/** Requests expected to take longer queue with the sweeps, so that the threads for small ones stay free. */
const SMALL_MICROSECONDS = 50_000;
const SMALL_THREADS = 2;
/** Sweeps give way to the server's own thread and to small requests. */
const SWEEP_NICENESS = 5;
/** A request over HTTP that takes longer should be a run. */
const SOLVE_TIMEOUT_MS = 60_000;

type PoolState = { ok: boolean; detail: string };

/** The threads of one process: all numbers of Skewlight are computed here. */
export type ComputePool = MaterialPool &
  DesignPool &
  LivePool & {
    /**
     * Solves a request whose input is valid (schema and `solveRules.ts`); a small one is answered while sweeps run.
     *
     * @throws ComputeError `refused`, `crashed` or `timeout` (60 s)
     */
    solve(request: SolveRequest): Promise<SolveResponse>;
    /**
     * Runs a sweep over all cores. A cancelled one rejects at once.
     *
     * @throws ComputeError `cancelled`, `refused` (issues inside a solve case, such as `layers[1].material`),
     *   `crashed` or `closed`
     */
    sweep(input: SweepInput, options?: SweepOptions): Promise<SweepResult>;
    /** Loads the code in every thread, so that the first question does not wait for it. */
    warm(): Promise<void>;
    /** Ends the threads; work under way fails with `closed`. */
    close(): Promise<void>;
    state(): PoolState;
  };

/**
 * Starts the threads.
 *
 * @param options.threads for sweeps; left out, one for each core
 * @param options.taskFile, options.heapMb for tests: what the threads load, and how much they may hold
 */
export function createPool(options: { threads?: number; taskFile?: URL; heapMb?: number } = {}): ComputePool {
  const { threads = availableParallelism(), taskFile, heapMb } = options;
  const sweeps = new Threads({ count: threads, niceIncrement: SWEEP_NICENESS, taskFile, heapMb });
  const small = new Threads({ count: SMALL_THREADS, taskFile, heapMb });

  return {
    ...materialPool({ small, large: sweeps }),
    ...designPool(sweeps),
    ...livePool({ small, large: sweeps }),
    solve(request) {
      const chosen = microsecondsOf(request) <= SMALL_MICROSECONDS ? small : sweeps;
      return runLimited(chosen, 'solve', request, {
        milliseconds: SOLVE_TIMEOUT_MS,
        message: `The request took longer than ${SOLVE_TIMEOUT_MS / 1000} s: ask fewer points, or start a run instead.`,
      });
    },
    sweep: (input, sweepOptions) =>
      runSweep(input, threads, (task, signal) => sweeps.run('sweepChunk', task, signal), sweepOptions),
    async warm() {
      await Promise.all([sweeps.warm(), small.warm()]);
    },
    async close() {
      await Promise.all([sweeps.close(), small.close()]);
    },
    state() {
      const [large, quick] = [sweeps.state(), small.state()];
      return {
        ok: large.threads > 0 && quick.threads > 0,
        detail: `${large.threads} threads for sweeps (${large.waiting} chunks wait), ${quick.threads} for small requests (${quick.waiting} wait)`,
      };
    },
  };
}
