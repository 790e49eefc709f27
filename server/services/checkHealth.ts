import type { Health } from '../../shared/health.ts';
import type { AppDependencies, PartHealth } from '../dependencies.ts';
import type { Models } from '../models/models.ts';
import { version } from '../version.ts';

/** Longer than this counts as no answer: whoever asks for health decides quickly. */
const PATIENCE_MS = 3_000;

/** Asks the database, the queue and the pool, at the same time. Never throws. */
export async function checkHealth({ config, models, jobs, pool }: AppDependencies): Promise<Health> {
  const [database, queue] = await Promise.all([part(() => checkDatabase(models)), part(() => jobs.health())]);
  const { ok, detail } = pool.state();
  return {
    ok: database.ok && queue.ok && ok,
    version,
    demo: config.demo,
    database,
    queue,
    pool: { ok, detail },
  };
}

async function checkDatabase(models: Models): Promise<PartHealth> {
  const start = performance.now();
  await models.sequelize.query('SELECT 1');
  return { ok: true, detail: `answers in ${(performance.now() - start).toFixed(1)} ms` };
}

async function part(check: () => Promise<PartHealth>): Promise<PartHealth> {
  let timer: NodeJS.Timeout | undefined;
  const impatience = new Promise<PartHealth>((resolve) => {
    timer = setTimeout(
      () => resolve({ ok: false, detail: `no answer within ${PATIENCE_MS} ms` }),
      PATIENCE_MS,
    );
  });
  try {
    return await Promise.race([check(), impatience]);
  } catch {
    // The cause may name hosts and accounts; it is in the log of whatever ran into it.
    return { ok: false, detail: 'cannot be reached' };
  } finally {
    clearTimeout(timer);
  }
}
