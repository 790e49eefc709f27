import { z } from 'zod';
import type { Sequelize, Transaction } from 'sequelize';
import { runProgressSchema } from '../../shared/run.ts';

/** The channel of PostgreSQL's LISTEN and NOTIFY on which hosts and servers talk about runs. */
export const RUN_CHANNEL = 'skewlight_runs';

/** PostgreSQL takes payloads up to 8,000 bytes; an error text longer than this is cut in the notice, not in the row. */
const MOST_ERROR_CHARACTERS = 1_000;

export const runNoticeSchema = z.discriminatedUnion('kind', [
  /** A run waits: whoever is free may take it. */
  z.object({ kind: z.literal('queued') }),
  /** A run was cancelled or deleted: whoever computes it stops. */
  z.object({ kind: z.literal('stop'), runId: z.string() }),
  /** A run went on, or came to its end. */
  z.object({ kind: z.literal('progress'), runId: z.string(), progress: runProgressSchema }),
]);

export type RunNotice = z.infer<typeof runNoticeSchema>;

/** Tells every host and server; inside a transaction once it commits. */
export async function sendRunNotice(
  sequelize: Sequelize,
  notice: RunNotice,
  transaction?: Transaction,
): Promise<void> {
  await sequelize.query('SELECT pg_notify($1, $2)', {
    bind: [RUN_CHANNEL, JSON.stringify(shortened(notice))],
    transaction,
  });
}

function shortened(notice: RunNotice): RunNotice {
  if (notice.kind !== 'progress' || notice.progress.error === null) return notice;
  const error = notice.progress.error.slice(0, MOST_ERROR_CHARACTERS);
  return { ...notice, progress: { ...notice.progress, error } };
}
