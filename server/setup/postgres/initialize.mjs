import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { run } from '../processes/children.mjs';
import { ownIdentity } from '../processes/identity.mjs';
import { asAccount, giveToAccount } from './account.mjs';

/** The one role of the local cluster. */
export const ROLE = 'skewlight';

/** @param {import('./account.mjs').ClusterPlace} place */
const passwordFile = ({ home }) => path.join(home, 'password');

/** @param {import('./account.mjs').ClusterPlace} place */
export const readPassword = (place) => fs.readFileSync(passwordFile(place), 'utf8').trim();

/** Major version of the existing cluster, undefined when there is none. @param {import('./account.mjs').ClusterPlace} place */
export function clusterVersion({ data }) {
  const file = path.join(data, 'PG_VERSION');
  return fs.existsSync(file) ? fs.readFileSync(file, 'utf8').trim() : undefined;
}

/** Followed by the process that makes it: an initdb whose parent was killed still writes for a moment. */
const UNFINISHED = '.unfinished-';

/** @param {import('./account.mjs').ClusterPlace} place */
function removeUnfinished({ home, data }) {
  for (const name of fs.readdirSync(home)) {
    if (!name.startsWith(`${path.basename(data)}${UNFINISHED}`)) continue;
    try {
      fs.rmSync(path.join(home, name), { recursive: true, force: true });
    } catch {
      // Still being written to; it is in nobody's way.
    }
  }
}

/**
 * Makes the cluster. In a folder aside that gets its name when it is complete: an initdb that was killed leaves
 * nothing that looks like a cluster.
 * @param {import('./account.mjs').ClusterPlace} place
 * @param {string} binaries
 */
export async function initialize(place, binaries) {
  removeUnfinished(place);
  const aside = `${place.data}${UNFINISHED}${ownIdentity}`;

  const password = passwordFile(place);
  fs.writeFileSync(password, `${randomBytes(24).toString('hex')}\n`, { mode: 0o600 });
  giveToAccount(place, password);

  const [program, ...args] = asAccount(place, [
    path.join(binaries, 'initdb'),
    ...['-D', aside, '-U', ROLE, `--pwfile=${password}`],
    // Every connection by password, also from this machine: others may have accounts on it.
    ...['-A', 'scram-sha-256', '-E', 'UTF8', '--locale=C.UTF-8'],
    // Nothing is in it yet that a power cut could lose, and the sync takes longer than the rest.
    '-N',
  ]);
  await run(program, args, { cwd: '/' });
  fs.renameSync(aside, place.data);
}
