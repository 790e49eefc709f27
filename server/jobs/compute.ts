import { setTimeout as sleep } from 'node:timers/promises';
import { pino } from 'pino';
import { createPool } from '../../worker/pool.ts';
import { readConfig } from '../config.ts';
import type { Jobs } from '../dependencies.ts';
import { createModels } from '../models/models.ts';
import { createMaterialStore } from '../services/materialStore.ts';
import { startJobs } from './start.ts';

/**
 * The entry of `npm run compute`: one more machine for the runs of a server. It answers no requests, so it needs the
 * database and nothing else.
 */
const RETRY_MS = 2_000;

// What only a web server needs is filled in: production would refuse to start without it.
const config = readConfig({
  SESSION_SECRET: 'a compute host signs no sessions',
  PUBLIC_URL: 'http://127.0.0.1',
  MAIL_URL: 'smtp://127.0.0.1',
  ...process.env,
  COMPUTE: 'on',
});
const logger = pino({ level: config.logLevel });
const stopping = new AbortController();
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.once(signal, () => {
    logger.info({ signal }, 'Giving runs back to the queue');
    stopping.abort();
  });
}

const models = createModels(config.databaseUrl);
const pool = createPool({ threads: config.threads });
await pool.warm();
const jobs = await startWhenReady();
if (jobs) {
  await new Promise((resolve) => {
    if (stopping.signal.aborted) resolve(undefined);
    stopping.signal.addEventListener('abort', resolve, { once: true });
  });
  await jobs.stop();
}
await pool.close();
await models.sequelize.close();
process.exit(0);

/** Waits for the database and for the server to have migrated it; null when asked to stop before. */
async function startWhenReady(): Promise<Jobs | null> {
  while (!stopping.signal.aborted) {
    try {
      await models.Run.findOne({ attributes: ['id'] });
      return await startJobs({ config, models, materials: createMaterialStore(models), logger, pool });
    } catch (error) {
      logger.warn({ err: error }, 'The database is not ready; trying again');
      await sleep(RETRY_MS, undefined, { signal: stopping.signal }).catch(() => {});
    }
  }
  return null;
}
