import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { SetupError } from '../setupError.mjs';
import { isAlive, ownIdentity } from './identity.mjs';
import { throwIfStopping } from './stopping.mjs';

const POLL_MS = 100;
/** Longer than the slowest holder, an `npm ci` over a slow line. */
const TIMEOUT_MS = 10 * 60_000;

/** @param {string} file */
function readOrEmpty(file) {
  try {
    return fs.readFileSync(file, 'utf8').trim();
  } catch {
    return '';
  }
}

/**
 * Takes the lock if nobody alive holds it. `link` fails when the name exists, and the file is complete before it
 * gets the name, so a reader never sees it half written.
 * @param {string} file
 * @returns {boolean}
 */
function tryTake(file) {
  const own = `${file}.${ownIdentity}`;
  fs.writeFileSync(own, ownIdentity);
  try {
    fs.linkSync(own, file);
    return true;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  } finally {
    fs.rmSync(own, { force: true });
  }
  const holder = readOrEmpty(file);
  if (holder !== '' && !isAlive(holder)) {
    // Renamed before it is removed: of two processes that find the same dead holder only one gets it.
    const away = `${own}.stale`;
    try {
      fs.renameSync(file, away);
      if (readOrEmpty(away) !== holder) fs.linkSync(away, file);
      fs.rmSync(away, { force: true });
    } catch {
      // Another process was faster; the next round sees its lock.
    }
  }
  return false;
}

/**
 * Runs the work while this process alone holds the lock. A holder that was killed does not block.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withFileLock(file, work) {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  const deadline = Date.now() + TIMEOUT_MS;
  while (!tryTake(file)) {
    throwIfStopping();
    if (Date.now() > deadline) {
      throw new SetupError(
        `Process ${readOrEmpty(file)} holds ${file} for too long.`,
        `Stop it, or: rm ${file}`,
      );
    }
    await sleep(POLL_MS);
  }
  try {
    return await work();
  } finally {
    fs.rmSync(file, { force: true });
  }
}
