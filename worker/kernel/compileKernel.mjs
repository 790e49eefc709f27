import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { KERNEL_OPTIONS, kernelFile, kernelSources, projectFolder } from './kernelFile.mjs';

/**
 * Compiles the kernel unless the present sources are compiled already.
 * @param {string} [root] the project's folder
 * @returns {Promise<string>} the WebAssembly file
 * @throws Error with the compiler's messages
 */
export async function compileKernel(root = projectFolder()) {
  const file = kernelFile(root);
  if (fs.existsSync(file)) return file;
  const { main } = await import('assemblyscript/asc');
  // The compiler insists on .ts; the sources are not TypeScript and do not claim to be.
  const texts = new Map(
    kernelSources(root).map(({ name, text }) => [
      `${name.slice(0, -3)}.ts`,
      text.replaceAll(/from '\.\/(\w+)\.as'/g, "from './$1'"),
    ]),
  );
  /** @type {Uint8Array | null} */
  let compiled = null;
  const { error, stderr } = await main(['kernel.ts', ...KERNEL_OPTIONS, '--outFile', 'kernel.wasm'], {
    readFile: (name) => texts.get(path.posix.normalize(name)) ?? null,
    writeFile: (_name, contents) => {
      if (typeof contents !== 'string') compiled = contents;
    },
    listFiles: () => [],
  });
  if (error || !compiled) throw new Error(`The kernel does not compile.\n${stderr.toString()}`);
  fs.mkdirSync(path.dirname(file), { recursive: true });
  // Whole or not at all, also when two processes compile at once.
  const draft = `${file}.${process.pid}`;
  fs.writeFileSync(draft, compiled);
  fs.renameSync(draft, file);
  for (const name of fs.readdirSync(path.dirname(file))) {
    const old = path.join(path.dirname(file), name);
    if (name.endsWith('.wasm') && old !== file) fs.rmSync(old, { force: true });
  }
  return file;
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  process.stdout.write(`${await compileKernel()}\n`);
}
