import fs from 'node:fs';

/**
 * A process as "pid-start": the pid alone is not enough, since after a reboot or in a restarted container the
 * same small numbers come again and a lock left by a killed process would look alive for ever.
 */

/**
 * State letter, parent and start time from /proc; undefined when there is no such process (or no /proc).
 * @param {number} pid
 */
export function procStat(pid) {
  try {
    const text = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The second field is the name in brackets and may itself hold spaces and brackets.
    const fields = text.slice(text.lastIndexOf(')') + 2).split(' ');
    return { state: fields[0], parent: fields[1], start: fields[19] };
  } catch {
    return undefined;
  }
}

const hasProc = fs.existsSync('/proc/self/stat');

/** Whether a process runs; one that is dead and only waits to be reaped does not. @param {number} pid */
export function runs(pid) {
  if (hasProc) {
    const stat = procStat(pid);
    return stat !== undefined && stat.state !== 'Z';
  }
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

export const ownIdentity = `${process.pid}-${procStat(process.pid)?.start ?? 0}`;

/** @param {string} identity as made above @returns {boolean} false also for text that is no identity */
export function isAlive(identity) {
  const match = /^(\d+)-(\d+)$/.exec(identity);
  if (!match) return false;
  const pid = Number(match[1]);
  return runs(pid) && (!hasProc || procStat(pid)?.start === match[2]);
}
