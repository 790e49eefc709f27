import { fn } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { RunProgress, RunState } from '../../shared/run.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import type { ComputedRun } from './computeRun.ts';
import { bytePieces } from './resultPieces.ts';
import type { RunQueue } from './runQueue.ts';
import { sendRunNotice } from './runNotices.ts';

type Change = Parameters<Models['Run']['update']>[0];

/**
 * One host's hold on one run, from taking it out of the queue to its end. Every change is made only while the row
 * still says that this host has it in this attempt: a run that was cancelled, deleted or given to another host
 * meanwhile is not touched.
 */
export class RunLease {
  readonly run: Run;
  readonly #models: Models;
  readonly #started = performance.now();

  private constructor(models: Models, run: Run) {
    this.#models = models;
    this.run = run;
  }

  /**
   * Takes a run that waits.
   *
   * @returns null when it does not wait any more: cancelled, deleted, or its entry stood twice in the queue
   */
  static async take(
    models: Models,
    runId: string,
    host: string,
    transaction: Transaction,
  ): Promise<RunLease | null> {
    const run = await models.Run.findOne({
      where: { id: runId, state: 'queued' },
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    if (!run) return null;
    await run.update(
      {
        state: 'running',
        host,
        attempts: run.attempts + 1,
        done: 0,
        error: null,
        startedAt: fn('now'),
        heartbeatAt: fn('now'),
      },
      { transaction },
    );
    return new RunLease(models, run);
  }

  get runId(): string {
    return this.run.id;
  }

  /** @returns false when the hold is lost */
  async reportProgress(done: number): Promise<boolean> {
    if (!(await this.#change({ done, heartbeatAt: fn('now') }))) return false;
    const seconds = (performance.now() - this.#started) / 1000;
    const secondsLeft = done > 0 ? (seconds / done) * (this.run.total - done) : null;
    await this.#notify('running', { done, secondsLeft });
    return true;
  }

  /** @returns false when the hold is lost */
  beat(): Promise<boolean> {
    return this.#change({ heartbeatAt: fn('now') });
  }

  /** Stores the numbers and the end of the run, both or neither. */
  async finish({ seconds, pieces }: ComputedRun): Promise<boolean> {
    // A search that ended early has done what there was to do.
    const done = this.run.total;
    return this.#models.sequelize.transaction(async (transaction) => {
      const held = await this.#change(
        {
          state: 'done',
          done,
          finishedAt: fn('now'),
          computeSeconds: seconds,
          solverVersion: SOLVER_VERSION,
        },
        transaction,
      );
      if (!held) return false;
      await this.#store(pieces(), transaction);
      await this.#notify('done', { done }, transaction);
      return true;
    });
  }

  /**
   * @param error what went wrong and what to do, for the person who started the run
   * @param found what was found until then, if anything
   */
  async fail(error: string, found: Buffer | null): Promise<boolean> {
    return this.#models.sequelize.transaction(async (transaction) => {
      const held = await this.#change({ state: 'failed', error, finishedAt: fn('now') }, transaction);
      if (!held) return false;
      if (found) await this.#store(bytePieces(found), transaction);
      await this.#notify('failed', { error }, transaction);
      return true;
    });
  }

  /** Stores what was found before the run was cancelled; nothing of one that was deleted or given to another host. */
  async keep(found: Buffer): Promise<boolean> {
    const { id, host, attempts } = this.run;
    return this.#models.sequelize.transaction(async (transaction) => {
      const cancelled = await this.#models.Run.findOne({
        where: { id, host, attempts, state: 'cancelled' },
        attributes: ['id'],
        lock: transaction.LOCK.UPDATE,
        transaction,
      });
      if (!cancelled) return false;
      await this.#store(bytePieces(found), transaction);
      return true;
    });
  }

  /** Gives the run back to the queue, as if it had not been taken: this host is stopping. */
  async giveBack(queue: RunQueue): Promise<boolean> {
    return this.#models.sequelize.transaction(async (transaction) => {
      const held = await this.#change(
        { state: 'queued', host: null, heartbeatAt: null, done: 0, attempts: this.run.attempts - 1 },
        transaction,
      );
      if (!held) return false;
      await queue.send(this.runId, transaction);
      await this.#notify('queued', { done: 0 }, transaction);
      return true;
    });
  }

  async #store(pieces: Iterable<Buffer>, transaction: Transaction): Promise<void> {
    let position = 0;
    for (const bytes of pieces) {
      // Bound, not spelled out in the statement: 4 MB in hex would be 8 MB of text.
      await this.#models.sequelize.query(
        'INSERT INTO run_chunks (run_id, position, bytes) VALUES ($1, $2, $3)',
        { bind: [this.runId, position, bytes], transaction },
      );
      position += 1;
    }
  }

  async #change(values: Change, transaction?: Transaction): Promise<boolean> {
    const { id, host, attempts } = this.run;
    const [count] = await this.#models.Run.update(values, {
      where: { id, host, attempts, state: 'running' },
      transaction,
    });
    return count === 1;
  }

  async #notify(state: RunState, values: Partial<RunProgress>, transaction?: Transaction): Promise<void> {
    const progress = { state, done: 0, total: this.run.total, secondsLeft: null, error: null, ...values };
    const notice = { kind: 'progress', runId: this.runId, progress } as const;
    await sendRunNotice(this.#models.sequelize, notice, transaction);
  }
}
