import fs from 'node:fs';
import { isAlive, procStat } from './identity.mjs';

/**
 * npm starts a script through `sh -c`. A SIGTERM to npm ends npm and the shell, and nobody passes it on to the
 * script, so this process would stay behind as an orphan with all it started. It therefore watches both.
 */

const POLL_MS = 250;
const DEPTH = 3;

/** The shell and the npm above this process; empty when npm did not start it. @returns {string[]} identities */
function npmAncestors() {
  // Set by npm. Without it the parent may be a shell that is rightly closed after `node ... &`.
  if (!process.env.npm_lifecycle_event) return [];
  const found = [];
  for (let pid = process.ppid; pid > 1 && found.length < DEPTH;) {
    const stat = procStat(pid);
    if (!stat) return [];
    found.push(`${pid}-${stat.start}`);
    if (/^(npm|node)/.test(fs.readFileSync(`/proc/${pid}/comm`, 'utf8'))) return found;
    pid = Number(stat.parent);
  }
  return [];
}

/** Calls back once when npm or its shell has ended. @param {() => void} ended */
export function watchNpm(ended) {
  const ancestors = npmAncestors();
  if (ancestors.length === 0) return;
  const timer = setInterval(() => {
    if (ancestors.every(isAlive)) return;
    clearInterval(timer);
    ended();
  }, POLL_MS);
  timer.unref();
}
