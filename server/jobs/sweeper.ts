import { Op, fn, literal } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { Logger } from 'pino';
import { isDatabaseAway } from '../http/toRefusal.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { isDesignRun } from '../models/run.ts';
import { askForLess } from './askForLess.ts';
import { expireImports } from './expireImports.ts';
import type { ImportReader } from './importReader.ts';
import { sendRunNotice } from './runNotices.ts';
import type { RunQueue } from './runQueue.ts';

/** A host beats every second; one that was silent this long is gone. */
const SILENT_SECONDS = 20;
/** A run waiting this long without an entry in the queue has lost it. */
const LOST_ENTRY_SECONDS = 60;
const INTERVAL_MS = 5_000;
/** Old imports are looked for this often. */
const EXPIRY_INTERVAL_MS = 3_600_000;
/** How long every host gets to beat after the database came back, before silence counts. */
const GRACE_MS = 10_000;
/** How often hosts may die over the same run before the run is blamed. */
const MOST_ATTEMPTS = 3;
/** Runs looked at in one go; the rest come at the next. */
const BATCH = 100;

type OrphanDependencies = { models: Models; queue: RunQueue; logger: Logger };
type SweeperDependencies = OrphanDependencies & { imports: ImportReader };

/**
 * Returns orphaned runs to the queue: those whose host fell silent, and those that wait without an entry in the queue.
 * A run that took three hosts with it fails.
 *
 * @param silentSeconds how long a host may say nothing
 * @returns how many runs went back, and how many failed
 */
export async function sweepOrphans(
  { models, queue, logger }: OrphanDependencies,
  silentSeconds = SILENT_SECONDS,
): Promise<{ returned: number; failed: number }> {
  return models.sequelize.transaction(async (transaction) => {
    const orphans = await models.Run.findAll({
      where: { state: 'running', heartbeatAt: { [Op.lt]: secondsAgo(silentSeconds) } },
      order: ['heartbeatAt'],
      limit: BATCH,
      lock: transaction.LOCK.UPDATE,
      // Another host may be sweeping, or the run's own host just coming back.
      skipLocked: true,
      transaction,
    });
    let failed = 0;
    for (const run of orphans) {
      const { host, attempts } = run;
      if (attempts >= MOST_ATTEMPTS) {
        await giveUp(models, run, transaction);
        failed += 1;
      } else {
        await run.update({ state: 'queued', host: null, heartbeatAt: null, done: 0 }, { transaction });
        await queue.send(run.id, transaction);
      }
      logger.warn({ runId: run.id, host, attempts }, 'The host of a run fell silent');
    }
    const resent = await sendAgain(models, queue, transaction);
    return { returned: orphans.length - failed + resent, failed };
  });
}

async function giveUp(models: Models, run: Run, transaction: Transaction): Promise<void> {
  const remedy = `To get an answer, ${askForLess(run)}; if it happens again, tell whoever runs the server.`;
  const error = `The computer that worked on this ${isDesignRun(run) ? 'design' : 'run'} stopped ${MOST_ATTEMPTS} times without finishing it. ${remedy}`;
  await run.update({ state: 'failed', error, finishedAt: fn('now') }, { transaction });
  const progress = { state: 'failed', done: run.done, total: run.total, secondsLeft: null, error } as const;
  await sendRunNotice(models.sequelize, { kind: 'progress', runId: run.id, progress }, transaction);
}

async function sendAgain(models: Models, queue: RunQueue, transaction: Transaction): Promise<number> {
  const waiting = await models.Run.findAll({
    attributes: ['id'],
    where: { state: 'queued', updatedAt: { [Op.lt]: secondsAgo(LOST_ENTRY_SECONDS) } },
    order: ['updatedAt'],
    limit: BATCH,
    lock: transaction.LOCK.UPDATE,
    skipLocked: true,
    transaction,
  });
  if (waiting.length === 0) return 0;
  const ids = waiting.map(({ id }) => id);
  const known = await queue.entriesOf(ids, transaction);
  const lost = ids.filter((id) => !known.has(id));
  for (const id of lost) await queue.send(id, transaction);
  return lost.length;
}

/** By the clock of the database: those of the hosts may differ. */
const secondsAgo = (seconds: number) => literal(`now() - interval '${seconds} seconds'`);

/** Sweeps every few seconds until it is stopped. */
export class Sweeper {
  readonly #dependencies: SweeperDependencies;
  readonly #timer: NodeJS.Timeout;
  #sweeping: Promise<void> | null = null;
  #seenSince: number | null = null;
  #expiredAt: number | null = null;

  constructor(dependencies: SweeperDependencies) {
    this.#dependencies = dependencies;
    this.#timer = setInterval(() => {
      this.#sweeping ??= this.#sweep().finally(() => (this.#sweeping = null));
    }, INTERVAL_MS);
  }

  async stop(): Promise<void> {
    clearInterval(this.#timer);
    await this.#sweeping;
  }

  async #expireNowAndThen(): Promise<void> {
    if (this.#expiredAt !== null && performance.now() - this.#expiredAt < EXPIRY_INTERVAL_MS) return;
    this.#expiredAt = performance.now();
    await expireImports(this.#dependencies.models);
  }

  async #sweep(): Promise<void> {
    try {
      // After the database was away every host looks silent: first give them time to say that they are not.
      await this.#dependencies.models.sequelize.query('SELECT 1');
      this.#seenSince ??= performance.now();
      if (performance.now() - this.#seenSince < GRACE_MS) return;
      await sweepOrphans(this.#dependencies);
      await this.#dependencies.imports.readLost();
      await this.#expireNowAndThen();
    } catch (error) {
      this.#seenSince = null;
      if (!isDatabaseAway(error)) this.#dependencies.logger.error({ err: error }, 'The sweeper failed');
    }
  }
}
