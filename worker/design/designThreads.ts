import { ComputeError } from '../sweep/computeError.ts';
import type { DesignStep, DesignTask, DesignWork } from './designInput.ts';

export type DesignOptions<Partial> = {
  signal?: AbortSignal;
  /** Called about five times a second, in the unit of `designTotal`. */
  onProgress?: (done: number, total: number) => void;
  /** What there is so far, where a question can say that before its end. */
  onPartial?: (soFar: Partial) => void;
};

/** Solves one step in a thread; rejects with a ComputeError, at the latest when its signal aborts. */
export type SubmitStep = (task: DesignTask, signal: AbortSignal) => Promise<unknown>;

const PROGRESS_MS = 200;
/** How long threads get to see the cancel flag before they are ended. */
const GRACE_MS = 500;

let designsStarted = 0;

/** The threads as one design calculation sees them. */
export class DesignThreads {
  readonly count: number;
  readonly #submit: SubmitStep;
  readonly #task: Omit<DesignTask, 'step'>;
  readonly #flags: Int32Array;
  readonly #ending = new AbortController();

  constructor(work: DesignWork, count: number, submit: SubmitStep) {
    this.count = count;
    this.#submit = submit;
    const flags = new SharedArrayBuffer(8);
    this.#flags = new Int32Array(flags);
    this.#task = { designId: (designsStarted += 1), work: toSharedJson(work), flags };
  }

  get done(): number {
    return Atomics.load(this.#flags, 0);
  }

  set done(value: number) {
    Atomics.store(this.#flags, 0, value);
  }

  /** One step; its answer is what designTask.ts gives for this kind of step. */
  run(step: DesignStep): Promise<unknown> {
    return this.#submit({ ...this.#task, step }, this.#ending.signal);
  }

  /** Steps in order over all threads; answers in the order of the steps. */
  async runAll(steps: DesignStep[]): Promise<unknown[]> {
    const answers: unknown[] = [];
    let next = 0;
    const lane = async () => {
      while (next < steps.length && Atomics.load(this.#flags, 1) === 0) {
        const mine = next;
        next += 1;
        answers[mine] = await this.run(steps[mine]!);
      }
    };
    await Promise.all(Array.from({ length: this.count }, lane));
    return answers;
  }

  /**
   * Settles with the calculation, or rejects as soon as the signal aborts.
   *
   * @throws ComputeError `cancelled`
   */
  async watch<Value>(
    total: number,
    { signal, onProgress }: Pick<DesignOptions<never>, 'signal' | 'onProgress'>,
    calculation: () => Promise<Value>,
  ): Promise<Value> {
    if (signal?.aborted) throw cancelled();
    let onAbort = () => {};
    const timer = onProgress && this.#watchProgress(total, onProgress);
    const work = calculation();
    const aborted = new Promise<never>((_resolve, reject) => {
      onAbort = () => {
        Atomics.store(this.#flags, 1, 1);
        const grace = setTimeout(() => this.#ending.abort(), GRACE_MS);
        // Nobody waits for the calculation any more.
        void work.catch(() => {}).finally(() => clearTimeout(grace));
        reject(cancelled());
      };
      signal?.addEventListener('abort', onAbort, { once: true });
    });
    try {
      return await Promise.race([work, aborted]);
    } catch (error) {
      Atomics.store(this.#flags, 1, 1);
      throw error;
    } finally {
      clearInterval(timer);
      signal?.removeEventListener('abort', onAbort);
    }
  }

  #watchProgress(total: number, onProgress: (done: number, total: number) => void): NodeJS.Timeout {
    let reported = 0;
    return setInterval(() => {
      const { done } = this;
      if (done === reported) return;
      reported = done;
      onProgress(Math.min(done, total), total);
    }, PROGRESS_MS);
  }
}

function cancelled(): ComputeError {
  return new ComputeError('cancelled', 'The calculation was cancelled.');
}

function toSharedJson(work: DesignWork): SharedArrayBuffer {
  const bytes = new TextEncoder().encode(JSON.stringify(work));
  const shared = new SharedArrayBuffer(bytes.byteLength);
  new Uint8Array(shared).set(bytes);
  return shared;
}

/** Numbers from 0 to count in pieces for the threads. */
export function piecesOf(count: number, size: number): { from: number; to: number }[] {
  return Array.from({ length: Math.ceil(count / size) }, (_, i) => ({
    from: i * size,
    to: Math.min(count, (i + 1) * size),
  }));
}
