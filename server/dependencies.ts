import type { Logger } from 'pino';
import type { Transaction } from 'sequelize';
import type { DesignResult } from '../shared/design.ts';
import type { CardMaking } from '../shared/growthCard.ts';
import type { RunProgress } from '../shared/run.ts';
import type { ComputePool } from '../worker/pool.ts';
import type { PartialResult } from '../worker/sweep/runSweep.ts';
import type { Config } from './config.ts';
import type { MailCatcher } from './mail/mailCatcher.ts';
import type { Mailer } from './mail/mailer.ts';
import type { GrowthCard } from './models/growthCard.ts';
import type { Models } from './models/models.ts';
import type { MaterialStore } from './services/materialStore.ts';

export type PartHealth = { ok: boolean; detail: string };

/** Everything a request handler or a job may use. Made once by index.ts, or by a test; nothing is global. */
export type Dependencies = {
  config: Config;
  models: Models;
  materials: MaterialStore;
  logger: Logger;
  pool: ComputePool;
  mailer: Mailer;
  /** The local mail server of development; null where real mail is sent. */
  mailCatcher: MailCatcher | null;
  /** Where people reach the server, without a slash at the end. A function: the port may be chosen at start. */
  publicUrl: () => string;
};

/** The reading of uploaded files as the rest of the server sees it. */
export type ImportReading = {
  /** Begins to read the file of a row that was just made; what becomes of it stands in the row. */
  begin(importId: string, attempts: 0): void;
  /** How far this process is with it, 0..1. */
  progressOf(importId: string): number;
};

/** How far a growth card is, in films; `bandsSince` is when the first was begun, ms. */
export type CardProgress = Omit<NonNullable<CardMaking['progress']>, 'secondsLeft'> & {
  bandsSince: number | null;
};

/** Makes a card, tells its steps on the way, and ends when the signal aborts. */
export type MakeCard = (
  signal: AbortSignal,
  report: (progress: Omit<CardProgress, 'bandsSince'>) => void,
) => Promise<GrowthCard>;

/** The making of growth cards as the rest of the server sees it: see CardMakings. */
export type CardMaker = {
  make(id: string, wanted: object, hungUp: AbortSignal, make: MakeCard): Promise<GrowthCard>;
  progressOf(id: string): CardProgress | null;
};

/** The queue of runs as the rest of the server sees it. */
export type Jobs = {
  health(): Promise<PartHealth>;
  stop(): Promise<void>;
  /** Puts a run that waits into the queue, in the transaction that makes it wait. */
  enqueue(runId: string, transaction: Transaction): Promise<void>;
  /**
   * Tells how a run goes on, until the returned function is called. `null` means: look at the row, the run was
   * cancelled or deleted, or notices may have been lost.
   */
  watch(runId: string, listener: (progress: RunProgress | null) => void): () => void;
  /** The numbers of a run that this process is computing, as far as they go; null for any other run. */
  partialResult(runId: string): PartialResult | null;
  /** What a design question that this process is answering has found so far; null for any other. */
  partialDesign(runId: string): DesignResult | null;
  imports: ImportReading;
  cards: CardMaker;
};

/** What request handlers have: the queue is started after everything that it depends on. */
export type AppDependencies = Dependencies & { jobs: Jobs };
