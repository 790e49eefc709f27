import { existsSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/**
 * The project's folder, found upward from this file: the same from the sources (server/) and from the bundle
 * (dist/server/), whatever folder the command was called from.
 */
export const projectRoot = findProjectRoot(path.dirname(fileURLToPath(import.meta.url)));

function findProjectRoot(folder: string): string {
  if (existsSync(path.join(folder, 'package.json'))) return folder;
  const parent = path.dirname(folder);
  if (parent === folder) throw new Error('No package.json above the server: is the project complete?');
  return findProjectRoot(parent);
}
