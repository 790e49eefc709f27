import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { inProject, projectRoot } from '../projectPaths.mjs';

/** Parts of the tree that no bundle contains: tests, this setup itself, and what the running app writes. */
const LEFT_OUT = [/\.test\.tsx?$/, /^server\/setup\//, /^data\/(pg|mail)(\/|$)/];

/** @param {string} place relative to the project @returns {string[]} files below it, or itself */
function filesOf(place) {
  if (LEFT_OUT.some((pattern) => pattern.test(place))) return [];
  const full = inProject(place);
  if (!fs.existsSync(full)) return [];
  if (!fs.statSync(full).isDirectory()) return [place];
  return fs
    .readdirSync(full)
    .sort()
    .flatMap((name) => filesOf(path.posix.join(place, name)));
}

/**
 * A hash over names and contents. Not modification times: a checkout or a copy of a branch changes those and
 * not the sources, or the other way round.
 * @param {string[]} places files and folders, relative to the project
 * @param {string} recipe how they are built: another recipe, another hash
 */
export function sourceHash(places, recipe) {
  const hash = createHash('sha256').update(recipe);
  for (const file of places.flatMap(filesOf)) {
    hash.update(`\0${file}\0`).update(fs.readFileSync(path.join(projectRoot, file)));
  }
  return hash.digest('hex');
}
