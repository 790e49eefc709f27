import fs from 'node:fs';
import path from 'node:path';
import { isAlive, ownIdentity } from '../processes/identity.mjs';

/**
 * Which processes use the cluster, one empty file each, named by the process. `npm test` beside a running
 * `npm start` shares its cluster, whichever came first, and the one that leaves last stops it. A process that
 * was killed leaves its file; it counts for nothing.
 */

/** @param {string} home */
const folder = (home) => path.join(home, 'users');

/** @param {string} home */
export function enter(home) {
  fs.mkdirSync(folder(home), { recursive: true });
  fs.writeFileSync(path.join(folder(home), ownIdentity), '');
}

/** @param {string} home @returns {boolean} whether nobody else uses the cluster now */
export function leave(home) {
  if (!fs.existsSync(folder(home))) return true;
  fs.rmSync(path.join(folder(home), ownIdentity), { force: true });
  const others = fs.readdirSync(folder(home)).filter((identity) => {
    if (isAlive(identity)) return true;
    fs.rmSync(path.join(folder(home), identity), { force: true });
    return false;
  });
  return others.length === 0;
}
