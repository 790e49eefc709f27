import { randomBytes } from 'node:crypto';
import { hostname } from 'node:os';
import { isDatabaseAway } from '../http/toRefusal.ts';
import type { DesignResult } from '../../shared/design.ts';
import { LOST, executeRun } from './executeRun.ts';
import type { ExecutionDependencies } from './executeRun.ts';
import type { PartialResult } from '../../worker/sweep/runSweep.ts';
import type { RunChannel } from './runChannel.ts';
import { RunLease } from './runLease.ts';

/** Runs that one host computes side by side: a short one does not wait for a long one. */
const MOST_RUNS = 4;
/** Looks into the queue without being told, should a notice have been lost. */
const POLL_MS = 2_000;
/** Says that its runs are alive, and notices when one is not its own any more. */
const BEAT_MS = 1_000;

type Running = {
  lease: RunLease;
  stopping: AbortController;
  ended: Promise<void>;
  /** Its numbers as they come in; null until the threads have it. */
  soFar: PartialResult | null;
  /** What a design question has found so far. */
  design: DesignResult | null;
};

/** Takes runs out of the queue and computes them on this machine. */
export class ComputeHost {
  /** Two hosts never have the same, not even one after the other on the same machine. */
  readonly name = `${hostname()}-${process.pid}-${randomBytes(4).toString('hex')}`;
  readonly #dependencies: ExecutionDependencies;
  readonly #running = new Map<string, Running>();
  readonly #timers: NodeJS.Timeout[] = [];
  readonly #stopListening: () => void;
  #taking: Promise<void> | null = null;
  #askedAgain = false;
  #stopped = false;

  constructor(dependencies: ExecutionDependencies, channel: RunChannel) {
    this.#dependencies = dependencies;
    this.#stopListening = channel.listen((notice) => {
      if (notice === 'reconnected' || notice.kind === 'queued') this.#wake();
      else if (notice.kind === 'stop') this.#running.get(notice.runId)?.stopping.abort(LOST);
    });
    this.#timers.push(
      setInterval(() => this.#wake(), POLL_MS),
      setInterval(() => void this.#beat(), BEAT_MS),
    );
    this.#wake();
  }

  get runCount(): number {
    return this.#running.size;
  }

  /** The numbers of a run that is being computed here, as far as they go. */
  partialResult(runId: string): PartialResult | null {
    return this.#running.get(runId)?.soFar ?? null;
  }

  /** What a design question that is being answered here has found so far. */
  partialDesign(runId: string): DesignResult | null {
    return this.#running.get(runId)?.design ?? null;
  }

  /** Stops taking runs and gives those under way back to the queue. */
  async stop(): Promise<void> {
    this.#stopped = true;
    this.#stopListening();
    this.#timers.forEach((timer) => clearInterval(timer));
    await this.#taking;
    const running = [...this.#running.values()];
    for (const { stopping } of running) stopping.abort('the host is stopping');
    await Promise.all(running.map(({ ended }) => ended));
  }

  /** Takes what there is; asked while it does, it looks once more afterwards. */
  #wake(): void {
    if (this.#taking) {
      this.#askedAgain = true;
      return;
    }
    this.#askedAgain = false;
    this.#taking = this.#takeAll().finally(() => {
      this.#taking = null;
      if (this.#askedAgain) this.#wake();
    });
  }

  async #takeAll(): Promise<void> {
    try {
      while (!this.#stopped && this.#running.size < MOST_RUNS) {
        const taken = await this.#takeOne();
        if (taken === 'nothing waits') return;
        if (taken) this.#execute(taken);
      }
    } catch (error) {
      // Tried again at the next poll.
      if (!isDatabaseAway(error)) {
        this.#dependencies.logger.error({ err: error }, 'A run could not be taken from the queue');
      }
    }
  }

  /** @returns null for an entry whose run does not wait any more */
  #takeOne(): Promise<RunLease | 'nothing waits' | null> {
    const { models, queue } = this.#dependencies;
    return models.sequelize.transaction(async (transaction) => {
      const runId = await queue.take(transaction);
      return runId === null ? 'nothing waits' : RunLease.take(models, runId, this.name, transaction);
    });
  }

  #execute(lease: RunLease): void {
    const stopping = new AbortController();
    const running: Omit<Running, 'ended'> = { lease, stopping, soFar: null, design: null };
    const watch = {
      onStart: (soFar: PartialResult) => (running.soFar = soFar),
      onPartial: (soFar: DesignResult) => (running.design = soFar),
    };
    const ended = executeRun(lease, this.#dependencies, stopping, watch).finally(() => {
      this.#running.delete(lease.runId);
      if (!this.#stopped) this.#wake();
    });
    this.#running.set(lease.runId, Object.assign(running, { ended }));
  }

  #beating = false;

  async #beat(): Promise<void> {
    if (this.#beating) return;
    this.#beating = true;
    try {
      for (const { lease, stopping } of this.#running.values()) {
        const held = await lease.beat();
        // A run that has just come to its end is not held either, and not running any more.
        if (!held) stopping.abort(LOST);
      }
    } catch (error) {
      if (!isDatabaseAway(error)) this.#dependencies.logger.error({ err: error }, 'The heartbeat failed');
    } finally {
      this.#beating = false;
    }
  }
}
