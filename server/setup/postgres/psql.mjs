import path from 'node:path';
import { run } from '../processes/children.mjs';

/**
 * Runs SQL through psql: the setup has no packages of its own, and psql comes with the server.
 * @param {string} binaries folder of psql
 * @param {string} databaseUrl
 * @param {string} sql one statement
 * @returns {Promise<string[]>} the rows, one column
 */
export async function query(binaries, databaseUrl, sql) {
  const url = new URL(databaseUrl);
  const password = decodeURIComponent(url.password);
  // Not on the command line, where every user of the machine could read it.
  url.password = '';
  const output = await run(
    path.join(binaries, 'psql'),
    ['-XAtq', '-v', 'ON_ERROR_STOP=1', '-c', sql, url.href],
    {
      cwd: '/',
      env: { ...process.env, PGPASSWORD: password, PGCONNECT_TIMEOUT: '5' },
    },
  );
  return output.split('\n').filter((line) => line !== '');
}
