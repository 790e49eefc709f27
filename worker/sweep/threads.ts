import { existsSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import type { TaskOutcome } from '../taskOutcome.ts';
import { ComputeError } from './computeError.ts';

/** Heap of one thread. Results live in shared memory outside of it, so this is room for stacks and constants. */
const HEAP_MB = 1_024;
/** ... of it for what is dropped at once. Left alone, each thread takes tens of MB for that and keeps them. */
const YOUNG_HEAP_MB = 8;

/** A set of threads that run the functions of task.ts. */
export class Threads {
  readonly count: number;
  readonly #piscina: Piscina;
  #closed = false;

  /**
   * @param options.niceIncrement lowers the priority against the other threads of this process
   * @param options.taskFile what the threads load; left out, task.ts or its bundle
   * @param options.heapMb heap of one thread
   */
  constructor(options: { count: number; niceIncrement?: number; taskFile?: URL; heapMb?: number }) {
    const file = options.taskFile ?? locateTask();
    this.count = options.count;
    this.#piscina = new Piscina({
      filename: file.href,
      minThreads: options.count,
      maxThreads: options.count,
      niceIncrement: options.niceIncrement ?? 0,
      execArgv: isBundle(file) ? [] : ['--import', typescriptLoader()],
      resourceLimits: {
        maxOldGenerationSizeMb: options.heapMb ?? HEAP_MB,
        maxYoungGenerationSizeMb: YOUNG_HEAP_MB,
      },
    });
    // A thread that dies while idle is replaced at once; without a listener its error would end this process.
    this.#piscina.on('error', () => {});
  }

  /**
   * Runs one function of task.ts in a thread.
   *
   * @throws ComputeError when it refuses, when its thread dies, or when the signal aborts, which ends the thread
   */
  async run<Value>(name: string, task: unknown, signal: AbortSignal | null = null): Promise<Value> {
    if (this.#closed) throw new ComputeError('closed', 'The compute pool is closing.');
    let outcome: TaskOutcome<Value>;
    try {
      outcome = (await this.#piscina.run(task, { name, signal })) as TaskOutcome<Value>;
    } catch (error) {
      throw this.#explain(error, signal);
    }
    if (outcome.ok) return outcome.value;
    throw new ComputeError('refused', outcome.message, outcome.issues);
  }

  /** Waits until every thread has loaded its code. */
  async warm(): Promise<void> {
    await Promise.all(Array.from({ length: this.count }, () => this.run('warm', null)));
  }

  async close(): Promise<void> {
    this.#closed = true;
    await this.#piscina.destroy();
  }

  state(): { threads: number; waiting: number } {
    return { threads: this.#piscina.threads.length, waiting: this.#piscina.queueSize };
  }

  #explain(error: unknown, signal: AbortSignal | null): ComputeError {
    if (this.#closed) return new ComputeError('closed', 'The compute pool is closing.');
    if (signal?.aborted) return new ComputeError('cancelled', 'The work was cancelled.');
    const reason = error instanceof Error ? error.message : String(error);
    return new ComputeError('crashed', `A compute thread ended before its work was done: ${reason}`);
  }
}

/**
 * task.ts beside the sources, or its bundle: there this module is part of dist/server/index.js or
 * dist/server/jobs/compute.js, and the task lies at dist/worker/task.js.
 */
function locateTask(): URL {
  const candidates = ['../task.ts', '../worker/task.js', '../../worker/task.js'];
  const found = candidates
    .map((candidate) => new URL(candidate, import.meta.url))
    .find((candidate) => existsSync(fileURLToPath(candidate)));
  if (!found) throw new Error(`No task file beside ${import.meta.url}; tried ${candidates.join(', ')}.`);
  return found;
}

function isBundle(file: URL): boolean {
  return file.pathname.endsWith('.js');
}

/**
 * A module that makes a thread load TypeScript, for development and tests. Preloading tsx itself does not: it
 * registers in the main thread only.
 */
function typescriptLoader(): string {
  const tsx = pathToFileURL(createRequire(import.meta.url).resolve('tsx'));
  const api = new URL('./esm/api/index.mjs', tsx).href;
  return `data:text/javascript,import { register } from ${JSON.stringify(api)}; register();`;
}
