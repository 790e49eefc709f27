import { axesOf, pointCountOf } from '../../shared/runAxes.ts';
import { axisValues } from '../../shared/axisValues.ts';
import { ComputeError } from './computeError.ts';
import { planChunks } from './planChunks.ts';
import type { Chunk } from './planChunks.ts';
import { SharedResult } from './sharedResult.ts';
import type { SweepInput } from './sweepInput.ts';

/** What a thread needs for one chunk; the buffers are shared, not copied. */
export type ChunkTask = {
  sweepId: number;
  /** The SweepInput as JSON in UTF-8: read once in each thread, however many chunks it takes. */
  input: SharedArrayBuffer;
  result: SharedArrayBuffer;
  points: number;
  readings: number;
  chunk: Chunk;
};

export type SweepOptions = {
  signal?: AbortSignal;
  /** Called about five times a second while points come in, and at the end. */
  onProgress?: (done: number, total: number) => void;
  /** Gives the columns, which fill from now on, to whoever wants to look at them before all is done. */
  onStart?: (soFar: PartialResult) => void;
};

/** A result that is being filled: NaN where nothing is computed yet. */
export type PartialResult = Pick<SweepResult, 'axes' | 'columns' | 'points'> & {
  /** Points computed so far. */
  done: () => number;
};

export type SweepResult = {
  /** Values of each axis, the first innermost (shared/runAxes.ts). */
  axes: Float64Array[];
  /** The readings in the order asked; NaN where one does not exist. */
  columns: Float64Array<SharedArrayBuffer>[];
  points: number;
  seconds: number;
};

const PROGRESS_MS = 200;
/**
 * How long threads get to see the cancel flag before they are ended. A single point of a huge stack is slow, but new
 * threads take seconds to load their code, above all on a busy machine.
 */
const GRACE_MS = 500;

let sweepsStarted = 0;

/**
 * Runs one sweep over the threads behind `submit`. No more chunks than threads are under way at a time, so that
 * two sweeps share the cores evenly whichever came first.
 *
 * @param submit solves one chunk; rejects with a ComputeError, at the latest when its signal aborts
 * @throws ComputeError; nothing of the sweep is running any more when it is thrown, except on `cancelled`, where
 *   threads that do not answer within half a second are being ended
 */
export async function runSweep(
  input: SweepInput,
  threads: number,
  submit: (task: ChunkTask, signal: AbortSignal) => Promise<void>,
  { signal, onProgress, onStart }: SweepOptions = {},
): Promise<SweepResult> {
  if (signal?.aborted) throw cancelled();
  const started = performance.now();
  const points = pointCountOf(input);
  const axes = axesOf(input).map(({ axis }) => Float64Array.from(axisValues(axis)));
  const result = SharedResult.allocate(points, input.readings.length);
  onStart?.({ axes, columns: result.columns, points, done: () => result.done });
  const task = {
    sweepId: (sweepsStarted += 1),
    input: toSharedJson(input),
    result: result.buffer,
    points,
    readings: input.readings.length,
  };
  const chunks = planChunks(input, threads);
  const ending = new AbortController();
  let next = 0;
  const lane = async () => {
    while (next < chunks.length && !result.cancelled) {
      const chunk = chunks[next]!;
      next += 1;
      await submit({ ...task, chunk }, ending.signal);
    }
  };
  const progress = watchProgress(result, points, onProgress);
  try {
    await untilAborted(signal, result, ending, Promise.all(Array.from({ length: threads }, lane)));
  } finally {
    clearInterval(progress);
  }
  onProgress?.(result.done, points);
  return { axes, columns: result.columns, points, seconds: (performance.now() - started) / 1000 };
}

/** Settles with the lanes, or rejects as soon as the signal aborts; either way no lane goes on afterwards. */
async function untilAborted(
  signal: AbortSignal | undefined,
  result: SharedResult,
  ending: AbortController,
  lanes: Promise<unknown>,
): Promise<void> {
  let onAbort = () => {};
  const aborted = new Promise<never>((_resolve, reject) => {
    onAbort = () => {
      result.cancel();
      const timer = setTimeout(() => ending.abort(), GRACE_MS);
      // The rejection of a lane that is ended belongs to nobody: the caller has its answer already.
      void lanes.catch(() => {}).finally(() => clearTimeout(timer));
      reject(cancelled());
    };
    signal?.addEventListener('abort', onAbort, { once: true });
  });
  try {
    await Promise.race([lanes, aborted]);
  } catch (error) {
    result.cancel();
    throw error;
  } finally {
    signal?.removeEventListener('abort', onAbort);
  }
}

function cancelled(): ComputeError {
  return new ComputeError('cancelled', 'The sweep was cancelled.');
}

function watchProgress(
  result: SharedResult,
  points: number,
  onProgress: SweepOptions['onProgress'],
): NodeJS.Timeout | undefined {
  if (!onProgress) return undefined;
  let reported = 0;
  return setInterval(() => {
    const { done } = result;
    if (done === reported) return;
    reported = done;
    onProgress(done, points);
  }, PROGRESS_MS);
}

function toSharedJson(input: SweepInput): SharedArrayBuffer {
  const bytes = new TextEncoder().encode(JSON.stringify(input));
  const shared = new SharedArrayBuffer(bytes.byteLength);
  new Uint8Array(shared).set(bytes);
  return shared;
}
