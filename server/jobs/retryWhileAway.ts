import { setTimeout as sleep } from 'node:timers/promises';
import { isDatabaseAway } from '../http/toRefusal.ts';

const WAIT_MS = 1_000;
/** After this the work is given up: whoever else sees the database has taken it over long since. */
const MOST_ATTEMPTS = 300;

/**
 * Does work on the database, again and again while the database is away: minutes of computing must not be lost to a
 * restart of PostgreSQL.
 *
 * @param signal gives up
 * @throws whatever the work throws when the database is there, or what it threw last
 */
export async function retryWhileAway<Value>(work: () => Promise<Value>, signal: AbortSignal): Promise<Value> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await work();
    } catch (error) {
      if (!isDatabaseAway(error) || signal.aborted || attempt === MOST_ATTEMPTS) throw error;
    }
    await sleep(WAIT_MS, undefined, { signal }).catch(() => {});
  }
}
