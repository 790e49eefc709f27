import { spawnSync } from 'node:child_process';
import { installDebianPackage } from './debianPackage.mjs';

/** pdftotext, with which the tests read the growth cards; installed when it is missing. */
export async function providePoppler() {
  const { error } = spawnSync('pdftotext', ['-v'], { stdio: 'ignore' });
  if (error) await installDebianPackage('poppler-utils', 'pdftotext, which the tests read PDF with,');
}
