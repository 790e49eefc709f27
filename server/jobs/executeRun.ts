import type { Logger } from 'pino';
import type { DesignResult } from '../../shared/design.ts';
import type { ComputePool } from '../../worker/pool.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import { Refusal } from '../errors.ts';
import { isDatabaseAway } from '../http/toRefusal.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import type { MaterialStore } from '../services/materialStore.ts';
import { loadRunMaterials } from '../services/runMaterials.ts';
import { askForLess } from './askForLess.ts';
import { computeRun } from './computeRun.ts';
import type { ComputedRun, ComputeWatch } from './computeRun.ts';
import { releaseMemory } from '../../worker/releaseMemory.ts';
import { designBytes } from './designBytes.ts';
import type { RunLease } from './runLease.ts';
import type { RunQueue } from './runQueue.ts';
import { retryWhileAway } from './retryWhileAway.ts';

export type ExecutionDependencies = {
  models: Models;
  materials: MaterialStore;
  pool: ComputePool;
  queue: RunQueue;
  logger: Logger;
};

/** Reason to stop a run that is not this host's any more; with any other reason it goes back to the queue. */
export const LOST = 'cancelled, deleted or taken by another host';

/**
 * Computes one run and stores what came out: its numbers, or why there are none. Never rejects: when the database
 * stays away, the run is left to the sweeper.
 *
 * @param stopping aborted to stop the run, with `LOST` when it is not this host's any more
 * @param watch gets the numbers as they come in
 */
export async function executeRun(
  lease: RunLease,
  dependencies: ExecutionDependencies,
  stopping: AbortController,
  watch: Pick<ComputeWatch, 'onStart' | 'onPartial'>,
): Promise<void> {
  const { logger, queue } = dependencies;
  const log = logger.child({ runId: lease.runId });
  let storedBytes = 0;
  let found: DesignResult | null = null;
  const bytesFound = () => {
    try {
      return found && designBytes(found);
    } catch {
      // What cannot be read again is not worth keeping, and must not keep the run from its end.
      return null;
    }
  };
  const onPartial = (soFar: DesignResult) => {
    found = soFar;
    watch.onPartial(soFar);
  };
  try {
    const outcome = await compute(lease, dependencies, stopping, { ...watch, onPartial });
    switch (outcome.kind) {
      case 'stopped': {
        const kept = bytesFound();
        if (stopping.signal.reason !== LOST) await lease.giveBack(queue);
        else if (kept) await lease.keep(kept);
        log.info({ reason: String(stopping.signal.reason) }, 'A run was stopped');
        break;
      }
      case 'failed':
        await retryWhileAway(() => lease.fail(outcome.error, bytesFound()), stopping.signal);
        log.warn({ error: outcome.error }, 'A run failed');
        break;
      case 'solved': {
        const { seconds, bytes } = outcome.result;
        const stored = await retryWhileAway(() => lease.finish(outcome.result), stopping.signal);
        log.info({ seconds, bytes, stored }, 'A run was solved');
        storedBytes = bytes;
        break;
      }
    }
  } catch (error) {
    log.error({ err: error }, 'A run could not be brought to an end; it will be tried again');
  }
  // Once this function has returned, nothing holds the columns any more.
  setImmediate(() => releaseMemory(storedBytes));
}

type Outcome =
  | { kind: 'solved'; result: ComputedRun }
  /** `error` is for people. */
  | { kind: 'failed'; error: string }
  | { kind: 'stopped' };

async function compute(
  lease: RunLease,
  { materials: store, pool, logger }: ExecutionDependencies,
  stopping: AbortController,
  watch: Pick<ComputeWatch, 'onStart' | 'onPartial'>,
): Promise<Outcome> {
  let reporting = false;
  const report = async (done: number) => {
    // A slow database gets fewer reports, not a queue of them.
    if (reporting) return;
    reporting = true;
    try {
      if (!(await lease.reportProgress(done))) stopping.abort(LOST);
    } catch (error) {
      if (!isDatabaseAway(error)) logger.error({ err: error }, 'Progress could not be stored');
    } finally {
      reporting = false;
    }
  };
  try {
    const materials = await loadRunMaterials(store, lease.run);
    const result = await computeRun(pool, lease.run, materials, {
      signal: stopping.signal,
      ...watch,
      onProgress: (done, total) => {
        if (done < total) void report(done);
      },
    });
    return { kind: 'solved', result };
  } catch (error) {
    if (stopping.signal.aborted) return { kind: 'stopped' };
    if (isDatabaseAway(error)) throw error;
    if (error instanceof ComputeError && error.failure === 'closed') return { kind: 'stopped' };
    if (!(error instanceof ComputeError) && !(error instanceof Refusal)) {
      logger.error({ err: error, runId: lease.runId }, 'A run failed for a reason that nobody thought of');
    }
    return { kind: 'failed', error: describeFailure(error, lease.run) };
  }
}

/** What the person who started the run reads. */
function describeFailure(error: unknown, run: Run): string {
  if (error instanceof Refusal) return error.message;
  if (!(error instanceof ComputeError)) return 'Something went wrong on the server. The log has the details.';
  if (error.issues.length > 0)
    return error.issues.map(({ path, message }) => `${path}: ${message}`).join('\n');
  return error.failure === 'crashed'
    ? `${error.message}. Rerun it; if that fails again, ${askForLess(run)}.`
    : error.message;
}
