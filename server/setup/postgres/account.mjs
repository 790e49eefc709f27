import { createHash } from 'node:crypto';
import { execFileSync, spawnSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { inProject, projectRoot } from '../projectPaths.mjs';
import { SetupError } from '../setupError.mjs';

/**
 * Who runs PostgreSQL, and where its files lie. PostgreSQL refuses to run as root, so root lends it the account
 * `postgres`; anybody else runs it as themselves.
 *
 * @typedef {object} ClusterPlace
 * @property {string} home folder of the cluster, its password, port, log, lock and users
 * @property {string} data the cluster itself (PGDATA)
 * @property {string | undefined} account set when the server runs as another account than this process
 */

const isRoot = process.getuid?.() === 0;

/** @param {string} account @param {string} which option of `id` */
const idOf = (account, which) => Number(execFileSync('id', [which, account], { encoding: 'utf8' }));

/** The account that owns an existing cluster, or the one Debian's package makes. @param {string} home */
function accountFor(home) {
  const owner = fs.existsSync(home) ? fs.statSync(home).uid : 0;
  const name = owner === 0 ? 'postgres' : String(owner);
  const { status, stdout } = spawnSync('id', ['-nu', name], { encoding: 'utf8' });
  if (status === 0) return stdout.trim();
  throw new SetupError(
    `PostgreSQL refuses to run as root, and the account "${name}" to run it under does not exist.`,
    'Make it (useradd --system postgres), or run the command as another user than root.',
  );
}

/**
 * The command as the account of the cluster, to be started with cwd "/" (the account may not enter ours).
 * @param {{ account: string | undefined }} place
 * @param {string[]} command
 */
export const asAccount = ({ account }, command) =>
  account === undefined ? command : ['runuser', '-u', account, '--', ...command];

/** @param {string} account @param {string} folder */
function canEnter(account, folder) {
  const [program, ...args] = asAccount({ account }, ['test', '-x', folder]);
  return spawnSync(program, args, { cwd: '/' }).status === 0;
}

/** Decides the place and makes the folder. @returns {ClusterPlace} */
export function clusterPlace() {
  const inside = inProject('data', 'pg');
  if (!isRoot) {
    fs.mkdirSync(inside, { recursive: true, mode: 0o700 });
    try {
      fs.accessSync(inside, fs.constants.R_OK | fs.constants.W_OK | fs.constants.X_OK);
    } catch {
      throw new SetupError(
        `${inside} belongs to another account: the project was started as root before.`,
        'Run the command as root, or remove the folder with its data (sudo rm -r data/pg), or set DATABASE_URL.',
      );
    }
    return { home: inside, data: path.join(inside, 'cluster'), account: undefined };
  }
  const account = accountFor(inside);
  fs.mkdirSync(inProject('data'), { recursive: true });
  const home = canEnter(account, inProject('data'))
    ? inside
    : // A folder closed to others, such as a home folder: keep out of it, one cluster for each project path.
      `/var/lib/postgresql/skewlight-${createHash('sha256').update(projectRoot).digest('hex').slice(0, 12)}`;
  fs.mkdirSync(home, { recursive: true, mode: 0o700 });
  fs.chownSync(home, idOf(account, '-u'), idOf(account, '-g'));
  return { home, data: path.join(home, 'cluster'), account };
}

/** Gives a file that root wrote to the account of the cluster. @param {ClusterPlace} place @param {string} file */
export function giveToAccount({ account }, file) {
  if (account !== undefined) fs.chownSync(file, idOf(account, '-u'), idOf(account, '-g'));
}
