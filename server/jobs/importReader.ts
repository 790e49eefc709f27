import { Op, literal } from 'sequelize';
import type { Logger } from 'pino';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { Dependencies } from '../dependencies.ts';
import { isDatabaseAway } from '../http/toRefusal.ts';
import type { MaterialImport } from '../models/materialImport.ts';

/** Longer than the pool takes at the most; whoever began before that is gone. */
const LOST_SECONDS = 90;
/** How often a file may end the server that reads it before the file is blamed. */
const MOST_ATTEMPTS = 3;
/** Files looked at in one go. */
const BATCH = 20;

/** Ways in which a reading ends without a word about the file: it is read again. */
const INTERRUPTED = new Set(['cancelled', 'closed']);

type ReaderDependencies = Pick<Dependencies, 'models' | 'pool'> & { logger: Logger };

/**
 * Reads uploaded files in the pool while their senders ask how far it is. What a server that died left unread is
 * read by whichever sweeps first.
 */
export class ImportReader {
  readonly #dependencies: ReaderDependencies;
  readonly #underWay = new Map<string, { progress: number; ended: Promise<void> }>();
  readonly #stopping = new AbortController();

  constructor(dependencies: ReaderDependencies) {
    this.#dependencies = dependencies;
  }

  /**
   * Begins to read a file; failures end up in its row.
   *
   * @param attempts how often somebody has begun: of several that take it up, one gets it
   */
  begin(importId: string, attempts: number): void {
    if (this.#underWay.has(importId) || this.#stopping.signal.aborted) return;
    const ended = this.#read(importId, attempts).finally(() => this.#underWay.delete(importId));
    this.#underWay.set(importId, { progress: 0, ended });
  }

  /** How far this process is with a file, 0..1; 0 for one that it does not read. */
  progressOf(importId: string): number {
    return this.#underWay.get(importId)?.progress ?? 0;
  }

  /**
   * Begins to read what nobody reads any more.
   *
   * @param lostSeconds how long ago somebody may have begun
   */
  async readLost(lostSeconds = LOST_SECONDS): Promise<void> {
    const lost = await this.#dependencies.models.MaterialImport.findAll({
      attributes: ['id', 'attempts'],
      where: { state: 'reading', readingAt: { [Op.lte]: secondsAgo(lostSeconds) } },
      order: ['readingAt'],
      limit: BATCH,
    });
    for (const { id, attempts } of lost) this.begin(id, attempts);
  }

  /** Interrupts what is under way; another start reads it again. */
  async stop(): Promise<void> {
    this.#stopping.abort();
    await Promise.all([...this.#underWay.values()].map(({ ended }) => ended));
  }

  async #read(importId: string, attempts: number): Promise<void> {
    const { logger } = this.#dependencies;
    try {
      const row = await this.#claim(importId, attempts);
      if (row?.bytes) await this.#readClaimed(row, row.bytes);
    } catch (error) {
      // The row still says `reading`: the sweeper takes it up again.
      if (!isDatabaseAway(error)) logger.error({ err: error, importId }, 'An import was not read');
    }
  }

  /** Null when it is gone, was read meanwhile, or is read elsewhere. */
  async #claim(importId: string, attempts: number): Promise<MaterialImport | null> {
    const { models } = this.#dependencies;
    const [claimed] = await models.MaterialImport.update(
      { readingAt: literal('now()'), attempts: attempts + 1 },
      { where: { id: importId, state: 'reading', attempts } },
    );
    return claimed === 0 ? null : models.MaterialImport.scope('withBytes').findByPk(importId);
  }

  async #readClaimed({ id, attempts }: MaterialImport, bytes: Buffer): Promise<void> {
    if (attempts > MOST_ATTEMPTS) {
      return this.#refuse(id, `The server stopped ${MOST_ATTEMPTS} times while it read this file.`);
    }
    try {
      const { table, exported } = await this.#dependencies.pool.readTable(bytes, {
        signal: this.#stopping.signal,
        onProgress: (fraction) => {
          const entry = this.#underWay.get(id);
          if (entry) entry.progress = fraction;
        },
      });
      await this.#dependencies.models.MaterialImport.update(
        { state: 'ready', tableJson: table, exported },
        { where: { id, state: 'reading' } },
      );
    } catch (error) {
      if (!(error instanceof ComputeError)) throw error;
      if (INTERRUPTED.has(error.failure)) return;
      if (error.failure === 'crashed') {
        this.#dependencies.logger.error({ err: error, importId: id }, 'A file ended the thread that read it');
        return this.#refuse(
          id,
          'This file could not be read. Keep only the rows and columns that are needed.',
        );
      }
      return this.#refuse(id, error.message);
    }
  }

  /** Says why, and keeps nothing of the file. */
  async #refuse(id: string, error: string): Promise<void> {
    await this.#dependencies.models.MaterialImport.update(
      { state: 'refused', error, bytes: null },
      { where: { id, state: 'reading' } },
    );
  }
}

const secondsAgo = (seconds: number) => literal(`now() - interval '${seconds} seconds'`);
