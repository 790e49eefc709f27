import { createHash } from 'node:crypto';
import os from 'node:os';
import { isAlive, ownIdentity } from '../processes/identity.mjs';
import { undoAtEnd } from '../processes/stopping.mjs';
import { query } from '../postgres/psql.mjs';

/**
 * Throw-away databases, named by machine and process, so that one left by a killed run is told from one in use:
 * skewlight_test_<machine>_<pid>_<start>_<stage>. The machine matters where several test on one server.
 */
const PREFIX = 'skewlight_test';
const machine = createHash('sha256').update(os.hostname()).digest('hex').slice(0, 8);

/** @param {string} name @returns {boolean} */
function isAbandoned(name) {
  const match = /^skewlight_test_([0-9a-f]{8})_(\d+)_(\d+)_/.exec(name);
  return match !== null && match[1] === machine && !isAlive(`${match[2]}-${match[3]}`);
}

/**
 * @param {{ adminUrl: string, binaries: string }} server
 * @returns {Promise<(stage: string) => Promise<string>>} makes a fresh database for a stage, answers its URL
 */
export async function testDatabases({ adminUrl, binaries }) {
  /** @param {string} name */
  const drop = (name) => query(binaries, adminUrl, `drop database if exists ${name} with (force)`);

  const present = await query(binaries, adminUrl, 'select datname from pg_database');
  for (const name of present.filter(isAbandoned)) await drop(name);

  return async (stage) => {
    const name = `${PREFIX}_${machine}_${ownIdentity.replace('-', '_')}_${stage}`;
    undoAtEnd(async () => {
      await drop(name);
    });
    await query(binaries, adminUrl, `create database ${name} template template0`);
    // Nothing here must survive a power cut; waiting for the disk at each commit is most of a test's time.
    await query(binaries, adminUrl, `alter database ${name} set synchronous_commit = off`);
    const url = new URL(adminUrl);
    url.pathname = `/${name}`;
    return url.href;
  };
}
