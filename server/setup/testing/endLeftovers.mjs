import fs from 'node:fs';
import { isAlive, ownIdentity } from '../processes/identity.mjs';

const VARIABLE = 'SKEWLIGHT_TEST_RUN';

/** To be set for all that a stage starts, and so inherited by all that those start. */
export const runMark = { [VARIABLE]: ownIdentity };

/** @param {string} pid @returns {string | undefined} the run that started the process */
function markOf(pid) {
  try {
    const environment = fs.readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0');
    return environment.find((entry) => entry.startsWith(`${VARIABLE}=`))?.slice(VARIABLE.length + 1);
  } catch {
    // Ended meanwhile, or another user's.
    return undefined;
  }
}

/**
 * Kills what a stage of this run left running, or any stage of a run that was killed. A browser puts itself into
 * a process group of its own and so outlives the vitest that started it. Does nothing where there is no /proc.
 */
export function endLeftovers() {
  if (!fs.existsSync('/proc/self/environ')) return;
  for (const pid of fs.readdirSync('/proc').filter((entry) => /^\d+$/.test(entry))) {
    const mark = markOf(pid);
    if (mark === undefined || (mark !== ownIdentity && isAlive(mark))) continue;
    try {
      process.kill(Number(pid), 'SIGKILL');
    } catch {
      // Ended meanwhile.
    }
  }
}
