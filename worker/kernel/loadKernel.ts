import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { kernelFile, projectFolder } from './kernelFile.mjs';

let loaded: WebAssembly.Module | null = null;

/**
 * The compiled kernel, shared by all solvers of a thread. Compiles it first (1-2 s) where no build has done so.
 *
 * @throws Error with the compiler's messages when the sources do not compile
 */
export function loadKernel(): WebAssembly.Module {
  loaded ??= new WebAssembly.Module(fs.readFileSync(availableFile()));
  return loaded;
}

function availableFile(): string {
  const root = projectFolder();
  const file = kernelFile(root);
  // A solver is made in one go; so the compiler, which answers later, runs in a process of its own.
  if (!fs.existsSync(file)) {
    execFileSync(process.execPath, [path.join(root, 'worker/kernel/compileKernel.mjs')], {
      stdio: ['ignore', 'ignore', 'inherit'],
    });
  }
  return file;
}
