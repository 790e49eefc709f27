import fs from 'node:fs';
import path from 'node:path';
import { runs } from '../processes/identity.mjs';

/**
 * What postmaster.pid says: pid of the server and its port; undefined without the file.
 * @param {string} data folder of the cluster
 */
export function readPostmasterFile(data) {
  try {
    const lines = fs.readFileSync(path.join(data, 'postmaster.pid'), 'utf8').split('\n');
    return { pid: Number(lines[0]), port: Number(lines[3]) };
  } catch {
    return undefined;
  }
}

/**
 * Processes that really work on the cluster: each PostgreSQL process has the data folder as its current folder.
 * postmaster.pid alone does not tell: after kill -9 it stays, its pid may be a zombie or another program by now,
 * and backends of the dead server may still hold the shared memory.
 * @param {string} data folder of the cluster
 * @returns {number[]} pids
 */
export function serverProcesses(data) {
  const stated = readPostmasterFile(data)?.pid;
  if (!fs.existsSync('/proc/self/cwd')) return stated !== undefined && runs(stated) ? [stated] : [];
  const folder = fs.existsSync(data) ? fs.realpathSync(data) : data;
  return fs
    .readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .filter((name) => {
      try {
        return fs.readlinkSync(`/proc/${name}/cwd`) === folder;
      } catch {
        return false;
      }
    })
    .map(Number)
    .filter(runs);
}
