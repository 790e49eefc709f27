import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';
import type { Logger } from 'pino';
import { RUN_CHANNEL, runNoticeSchema } from './runNotices.ts';
import type { RunNotice } from './runNotices.ts';

const RETRY_MS = [200, 500, 1_000, 2_000];
/** Finds out that the other end is gone without a word, such as a pulled cable. */
const PING_MS = 10_000;
const ANSWER_MS = 5_000;

type Listener = (notice: RunNotice | 'reconnected') => void;

/** `lost` settles, and never rejects, once the connection is of no use any more. */
type Connection = { lost: Promise<void> };

/**
 * One connection that listens for notices about runs, and comes back by itself when the database was away. Whoever
 * listens must look at the rows after `reconnected`: notices of the meantime are lost.
 */
export class RunChannel {
  readonly #databaseUrl: string;
  readonly #logger: Logger;
  readonly #listeners = new Set<Listener>();
  readonly #stopping = new AbortController();
  #client: pg.Client | null = null;
  #keeping: Promise<void> = Promise.resolve();

  constructor(databaseUrl: string, logger: Logger) {
    this.#databaseUrl = databaseUrl;
    this.#logger = logger;
  }

  get connected(): boolean {
    return this.#client !== null;
  }

  /** @throws Error when the database cannot be reached now; later losses are mended */
  async start(): Promise<void> {
    this.#keeping = this.#keepConnected(await this.#connect());
  }

  async stop(): Promise<void> {
    this.#stopping.abort();
    await this.#client?.end().catch(() => {});
    await this.#keeping;
  }

  /** @returns call it to stop listening */
  listen(listener: Listener): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  async #connect(): Promise<Connection> {
    const client = new pg.Client({
      connectionString: this.#databaseUrl,
      application_name: 'skewlight runs',
      connectionTimeoutMillis: ANSWER_MS,
      query_timeout: ANSWER_MS,
      keepAlive: true,
    });
    const broken = new Promise<void>((resolve) => {
      client.on('error', () => resolve());
      client.on('end', () => resolve());
    });
    client.on('notification', ({ payload }) => this.#receive(payload ?? ''));
    try {
      await client.connect();
      await client.query(`LISTEN ${RUN_CHANNEL}`);
    } catch (error) {
      void client.end().catch(() => {});
      throw error;
    }
    this.#client = client;
    const lost = Promise.race([broken, this.#pingUntilSilent(client)]).finally(() => {
      this.#client = null;
      void client.end().catch(() => {});
    });
    return { lost };
  }

  async #pingUntilSilent(client: pg.Client): Promise<void> {
    try {
      for (;;) {
        await sleep(PING_MS, undefined, { signal: this.#stopping.signal, ref: false });
        await client.query('SELECT 1');
      }
    } catch {
      // Stopping, or no answer: lost in both cases.
    }
  }

  async #keepConnected(first: Connection): Promise<void> {
    let connection: Connection | null = first;
    while (connection) {
      await connection.lost;
      if (this.#stopping.signal.aborted) return;
      this.#logger.warn('Lost the database connection that listens for runs; connecting again');
      connection = await this.#connectUntilStopped();
      if (connection) this.#tell('reconnected');
    }
  }

  async #connectUntilStopped(): Promise<Connection | null> {
    const { signal } = this.#stopping;
    for (let attempt = 0; !signal.aborted; attempt += 1) {
      const wait = RETRY_MS[Math.min(attempt, RETRY_MS.length - 1)];
      await sleep(wait, undefined, { signal }).catch(() => {});
      if (signal.aborted) break;
      try {
        const connection = await this.#connect();
        this.#logger.info('Listening for runs again');
        return connection;
      } catch {
        // Still away; said once when it was lost.
      }
    }
    return null;
  }

  #receive(payload: string): void {
    const notice = parseNotice(payload);
    // Anybody who may connect to the database may notify; what is not ours is passed over.
    if (notice) this.#tell(notice);
  }

  #tell(notice: RunNotice | 'reconnected'): void {
    for (const listener of [...this.#listeners]) listener(notice);
  }
}

function parseNotice(payload: string): RunNotice | null {
  try {
    return runNoticeSchema.parse(JSON.parse(payload));
  } catch {
    return null;
  }
}
