import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const VERSION_FILE = 'node_modules/assemblyscript/package.json';

/** Options of the compiler. */
export const KERNEL_OPTIONS = [
  ...['--enable', 'simd', '--runtime', 'stub', '-O3', '--noAssert'],
  // Inlining is written out in the sources.
  ...['--converge', '--initialMemory', '1'],
];

/**
 * The project's folder: the nearest one above `from` that holds a package.json. The same from the sources and from a
 * bundle in dist/.
 * @param {string} from
 */
export function projectFolder(from = path.dirname(fileURLToPath(import.meta.url))) {
  if (fs.existsSync(path.join(from, 'package.json'))) return from;
  const above = path.dirname(from);
  if (above === from) throw new Error('no package.json in any folder above the kernel');
  return projectFolder(above);
}

/**
 * The sources of the kernel, which lie beside the physics they serve.
 * @param {string} root the project's folder
 */
export function kernelSources(root) {
  const folder = path.join(root, 'worker/optics/fast/kernel');
  return fs
    .readdirSync(folder)
    .filter((name) => name.endsWith('.as'))
    .sort()
    .map((name) => ({ name, text: fs.readFileSync(path.join(folder, name), 'utf8') }));
}

/**
 * Where the compiled kernel of the present sources is, or would be: the name carries a hash of the sources, the
 * options and the compiler's version, so a stale one is never found.
 * @param {string} [root] the project's folder
 */
export function kernelFile(root = projectFolder()) {
  const hash = createHash('sha256').update(KERNEL_OPTIONS.join(' '));
  hash.update(fs.readFileSync(path.join(root, VERSION_FILE)));
  for (const { name, text } of kernelSources(root)) hash.update(`\0${name}\0${text}`);
  return path.join(root, 'dist/kernel', `kernel-${hash.digest('hex').slice(0, 16)}.wasm`);
}
