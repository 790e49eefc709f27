import { createHash } from 'node:crypto';
import fs from 'node:fs';
import { run } from '../processes/children.mjs';
import { withFileLock } from '../processes/fileLock.mjs';
import { inProject } from '../projectPaths.mjs';
import { step } from '../step.mjs';

const lockfile = inProject('package-lock.json');
/** Inside node_modules, so that removing the folder removes the claim about it. */
const stamp = inProject('node_modules', '.skewlight-lock');
/** What npm itself writes last, after everything is in place. */
const installedLockfile = inProject('node_modules', '.package-lock.json');

/** @param {string} file @returns {Record<string, { version?: string, optional?: boolean }>} */
const lockedPackages = (file) => JSON.parse(fs.readFileSync(file, 'utf8')).packages;

/** Whether somebody's own `npm install` already put exactly the locked versions in place. */
function installedByHand() {
  if (!fs.existsSync(installedLockfile)) return false;
  const installed = lockedPackages(installedLockfile);
  return Object.entries(lockedPackages(lockfile)).every(
    // Optional ones are builds for other platforms, left out by npm here.
    ([place, { version, optional }]) => place === '' || optional || installed[place]?.version === version,
  );
}

/** @param {string} hash of package-lock.json */
const isInstalled = (hash) => fs.existsSync(stamp) && fs.readFileSync(stamp, 'utf8') === hash;

/** Makes node_modules match package-lock.json; does nothing when it does. */
export async function installPackages() {
  const hash = createHash('sha256').update(fs.readFileSync(lockfile)).digest('hex');
  if (isInstalled(hash)) return;
  // The lock is outside node_modules, which `npm ci` removes.
  await withFileLock(inProject('dist', 'packages.lock'), async () => {
    if (isInstalled(hash)) return;
    if (!installedByHand()) {
      await step('Installing npm packages', async () => {
        // Without --include=dev, NODE_ENV=production would leave out the programs that build the client.
        const args = ['ci', '--ignore-scripts', '--no-audit', '--no-fund', '--include=dev'];
        await run('npm', args, {
          remedy: 'Check the connection to the npm registry (npm ping), then run the command again.',
        });
      });
    }
    fs.writeFileSync(stamp, hash);
  });
}
