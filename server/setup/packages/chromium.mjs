import fs from 'node:fs';
import { SetupError } from '../setupError.mjs';
import { installDebianPackage } from './debianPackage.mjs';

const DEBIAN_PLACE = '/usr/bin/chromium';

/** The browser for the tests, installed when it is missing. @returns {Promise<string>} its path */
export async function provideChromium() {
  const chosen = process.env.CHROMIUM_PATH;
  if (chosen) {
    if (fs.existsSync(chosen)) return chosen;
    throw new SetupError(`CHROMIUM_PATH names ${chosen}, which does not exist.`, 'Correct it or unset it.');
  }
  if (!fs.existsSync(DEBIAN_PLACE)) {
    await installDebianPackage('chromium', 'Chromium, which the browser tests drive,');
  }
  return DEBIAN_PLACE;
}
