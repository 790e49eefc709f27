import PgBoss from 'pg-boss';
import { QueryTypes } from 'sequelize';
import type { Sequelize, Transaction } from 'sequelize';
import { sendRunNotice } from './runNotices.ts';

/** Tables of the queue package, apart from ours. */
const SCHEMA = 'queue';
const QUEUE = 'runs';
/** Longer than anybody waits; a run whose entry is lost all the same gets a new one from the sweeper. */
const KEPT_DAYS = 365;

type Entry = { runId: string };

/**
 * Which runs wait to be computed. The queue package gives each entry to one host only; everything else about a run
 * is in its row. An entry is sent in the transaction that makes the run wait and removed in the one that takes it, so
 * a host that dies in between loses nothing.
 */
export class RunQueue {
  readonly #sequelize: Sequelize;
  readonly #boss: PgBoss;

  constructor(sequelize: Sequelize) {
    this.#sequelize = sequelize;
    this.#boss = new PgBoss({
      db: this.#database(),
      schema: SCHEMA,
      // Entries are removed as they are taken: there is nothing to archive, expire or schedule.
      supervise: false,
      schedule: false,
    });
    this.#boss.on('error', () => {});
  }

  /** Makes the queue's tables where they are missing; harmless when another host does the same. */
  async start(): Promise<void> {
    await this.#boss.start();
    await this.#boss.createQueue(QUEUE);
  }

  async stop(): Promise<void> {
    await this.#boss.stop({ graceful: false });
  }

  /**
   * Puts a run in and tells every host, both once the transaction commits.
   *
   * @throws Error when the entry could not be made; the transaction must not be committed then
   */
  async send(runId: string, transaction: Transaction): Promise<void> {
    const entry: Entry = { runId };
    const id = await this.#boss.send(QUEUE, entry, {
      db: this.#database(transaction),
      retentionDays: KEPT_DAYS,
      retryLimit: 0,
    });
    if (id === null) throw new Error(`The queue did not take run ${runId}: its tables are missing.`);
    await sendRunNotice(this.#sequelize, { kind: 'queued' }, transaction);
  }

  /** Takes the oldest entry out, for good once the transaction commits; null when none waits. */
  async take(transaction: Transaction): Promise<string | null> {
    const db = this.#database(transaction);
    const [job] = await this.#boss.fetch<Entry>(QUEUE, { batchSize: 1, db });
    if (!job) return null;
    await this.#boss.deleteJob(QUEUE, job.id, { db });
    return job.data.runId;
  }

  /** Those of these runs for which an entry exists. */
  async entriesOf(runIds: string[], transaction: Transaction): Promise<Set<string>> {
    const rows = await this.#sequelize.query<Entry>(
      `SELECT data->>'runId' AS "runId" FROM ${SCHEMA}.job WHERE name = $1 AND data->>'runId' = ANY($2)`,
      { type: QueryTypes.SELECT, bind: [QUEUE, runIds], transaction },
    );
    return new Set(rows.map(({ runId }) => runId));
  }

  /** The queue package on our own connections, so that its entries and our rows change together. */
  #database(transaction?: Transaction): { executeSql: PgBoss.Db['executeSql'] } {
    return {
      executeSql: async (text: string, values?: unknown[]) => {
        const bind = values?.map((value) => value ?? null);
        const [rows] = await this.#sequelize.query(text, { bind, transaction });
        return { rows };
      },
    };
  }
}
