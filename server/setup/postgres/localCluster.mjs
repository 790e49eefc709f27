import path from 'node:path';
import { withFileLock } from '../processes/fileLock.mjs';
import { undoAtEnd } from '../processes/stopping.mjs';
import { step } from '../step.mjs';
import { clusterPlace } from './account.mjs';
import { binariesForVersion, providePostgresBinaries } from './binaries.mjs';
import { clusterVersion, initialize } from './initialize.mjs';
import { query } from './psql.mjs';
import { clusterUrl, ensureRunning, stop } from './server.mjs';
import { enter, leave } from './users.mjs';

const DATABASE = 'skewlight';

/** @param {string} binaries @param {string} adminUrl */
async function ensureDatabase(binaries, adminUrl) {
  const found = await query(binaries, adminUrl, `select 1 from pg_database where datname = '${DATABASE}'`);
  if (found.length === 0) await query(binaries, adminUrl, `create database ${DATABASE}`);
}

/**
 * Starts the project's own PostgreSQL, or shares the one that runs, until this process ends.
 * @returns {Promise<{ databaseUrl: string, adminUrl: string, binaries: string }>} adminUrl: for making databases
 */
export async function useLocalCluster() {
  // First the package: it makes the account that clusterPlace asks for.
  const newest = await providePostgresBinaries();
  const place = clusterPlace();
  const version = clusterVersion(place);
  const binaries = version === undefined ? newest : binariesForVersion(version, place.home);
  const lock = path.join(place.home, 'lock');

  undoAtEnd(() =>
    withFileLock(lock, async () => {
      if (leave(place.home)) await stop(place, binaries);
    }),
  );
  let port = 0;
  await step('PostgreSQL', () =>
    withFileLock(lock, async () => {
      enter(place.home);
      const isNew = clusterVersion(place) === undefined;
      if (isNew) await initialize(place, binaries);
      const running = await ensureRunning(place, binaries);
      port = running.port;
      await ensureDatabase(binaries, clusterUrl(place, port, 'postgres'));
      const state = isNew ? `new in ${place.home}` : running.started ? 'started' : 'shared, it was running';
      return `${state}, 127.0.0.1:${port}`;
    }),
  );
  return {
    databaseUrl: clusterUrl(place, port, DATABASE),
    adminUrl: clusterUrl(place, port, 'postgres'),
    binaries,
  };
}
