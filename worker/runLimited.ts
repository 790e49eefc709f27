import { ComputeError } from './sweep/computeError.ts';
import type { Threads } from './sweep/threads.ts';

/**
 * Runs one function of task.ts; one that takes too long loses its thread.
 *
 * @param limits how long it may take, waiting included, what is said then, and the caller's own wish to stop
 * @throws ComputeError, `timeout` or `cancelled` among others
 */
export async function runLimited<Value>(
  threads: Threads,
  name: string,
  task: unknown,
  limits: { milliseconds: number; message: string; signal?: AbortSignal | undefined },
): Promise<Value> {
  const timeout = AbortSignal.timeout(limits.milliseconds);
  const signal = limits.signal ? AbortSignal.any([timeout, limits.signal]) : timeout;
  try {
    return await threads.run<Value>(name, task, signal);
  } catch (error) {
    if (timeout.aborted && !limits.signal?.aborted) throw new ComputeError('timeout', limits.message);
    throw error;
  }
}
