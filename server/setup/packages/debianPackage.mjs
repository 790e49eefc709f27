import fs from 'node:fs';
import { run } from '../processes/children.mjs';
import { SetupError } from '../setupError.mjs';
import { step } from '../step.mjs';

/**
 * Installs one Debian package, or says how to.
 * @param {string} name of the package
 * @param {string} need what of it is missing here, for the message
 */
export async function installDebianPackage(name, need) {
  const hasApt = fs.existsSync('/usr/bin/apt-get');
  if (!hasApt || process.getuid?.() !== 0) {
    const command = hasApt
      ? `sudo apt-get update && sudo apt-get install -y ${name}`
      : `install the package that this system calls "${name}"`;
    throw new SetupError(`${need} is missing.`, `Install it, then run the command again: ${command}`);
  }
  await step(`Installing ${name}`, async () => {
    const options = {
      env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
      remedy: `Install it by hand, then run the command again: apt-get update && apt-get install -y ${name}`,
    };
    // Another apt may be at work (a machine that has just started updates itself): wait for it.
    const wait = ['-o', 'DPkg::Lock::Timeout=120'];
    await run('apt-get', ['update', '-qq', ...wait], options);
    await run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...wait, name], options);
  });
}
