import fs from 'node:fs';
import path from 'node:path';
import { installDebianPackage } from '../packages/debianPackage.mjs';
import { SetupError } from '../setupError.mjs';

const DEBIAN_PLACE = '/usr/lib/postgresql';
/** A folder with only some of these is a client package. */
const NEEDED = ['initdb', 'pg_ctl', 'postgres', 'psql'];

/** @param {string} folder */
const isComplete = (folder) => NEEDED.every((name) => fs.existsSync(path.join(folder, name)));

/** Folders with server programs, the newest version first, those on PATH last. */
function candidates() {
  const versions = fs.existsSync(DEBIAN_PLACE) ? fs.readdirSync(DEBIAN_PLACE) : [];
  return [
    ...versions
      .filter((name) => /^\d+(\.\d+)?$/.test(name))
      .sort((a, b) => Number(b) - Number(a))
      .map((name) => path.join(DEBIAN_PLACE, name, 'bin')),
    ...(process.env.PATH ?? '').split(path.delimiter).filter((folder) => path.isAbsolute(folder)),
  ].filter(isComplete);
}

/**
 * Without this the package makes and starts a cluster of its own on port 5432, which nobody here would stop.
 * The drop-in is read by Debian's pg_createcluster and touches no file of the package.
 */
function keepDebianFromStartingOne() {
  if (process.getuid?.() !== 0 || !fs.existsSync('/usr/bin/apt-get')) return;
  const folder = '/etc/postgresql-common/createcluster.d';
  fs.mkdirSync(folder, { recursive: true });
  fs.writeFileSync(path.join(folder, 'skewlight.conf'), 'create_main_cluster = false\n');
}

/**
 * The folder with initdb, pg_ctl, postgres and psql; installs the package when there is none.
 * @returns {Promise<string>}
 */
export async function providePostgresBinaries() {
  if (candidates().length === 0) {
    keepDebianFromStartingOne();
    await installDebianPackage('postgresql', 'The PostgreSQL server');
  }
  const [newest] = candidates();
  if (newest !== undefined) return newest;
  throw new SetupError('The PostgreSQL programs were not found after installing them.');
}

/**
 * The programs of the version that made a cluster: no other can open it.
 * @param {string} major
 * @param {string} home folder of the cluster
 * @returns {string}
 */
export function binariesForVersion(major, home) {
  const found = candidates();
  const fitting =
    found.find((folder) => path.basename(path.dirname(folder)) === major) ??
    // Folders on PATH do not tell their version by name; PostgreSQL itself refuses a wrong one and says so.
    found.find((folder) => !folder.startsWith(DEBIAN_PLACE));
  if (fitting !== undefined) return fitting;
  throw new SetupError(
    `The local database was made by PostgreSQL ${major}, and only ${found.join(', ')} is installed.`,
    `Install it (apt-get install -y postgresql-${major}), or remove the database with all its data: rm -r ${home}`,
  );
}
