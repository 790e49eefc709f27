import fs from 'node:fs';
import { run } from '../processes/children.mjs';
import { withFileLock } from '../processes/fileLock.mjs';
import { inProject, packageProgram } from '../projectPaths.mjs';
import { step } from '../step.mjs';
import { sourceHash } from './sourceHash.mjs';

/**
 * @typedef {object} Bundle
 * @property {string} name
 * @property {string[]} sources what it is made of; another content means another build
 * @property {string[]} command program of node_modules/.bin and its arguments
 * @property {string[]} outputs files that must exist after it, relative to the project
 */

/** @type {Bundle} */
const client = {
  name: 'client',
  sources: ['src', 'shared', 'index.html', 'vite.config.ts', 'tailwind.config.ts', 'package-lock.json'],
  command: ['vite', 'build', '--logLevel', 'warn'],
  outputs: ['dist/client/index.html'],
};

/** @type {Bundle} */
const server = {
  name: 'server',
  sources: ['server', 'worker', 'shared', 'data', 'package-lock.json'],
  command: [
    'esbuild',
    ...['server/index.ts', 'server/jobs/compute.ts', 'worker/task.ts'],
    // Dependencies stay in node_modules: some carry compiled parts that no bundle can hold.
    ...['--bundle', '--packages=external', '--platform=node', '--format=esm', '--target=node20'],
    // The depth of the sources is kept: the pool finds its task relative to itself in both.
    ...['--outbase=.', '--outdir=dist', '--sourcemap', '--log-level=warning'],
  ],
  outputs: ['dist/server/index.js', 'dist/server/jobs/compute.js', 'dist/worker/task.js'],
};

/** @param {Bundle} bundle */
const stampOf = ({ name }) => inProject('dist', `.${name}-sources`);

/** @param {Bundle} bundle */
const hashOf = ({ sources, command }) => sourceHash(sources, command.join(' '));

/** @param {Bundle} bundle @param {string} hash */
const isCurrent = (bundle, hash) =>
  bundle.outputs.every((file) => fs.existsSync(inProject(file))) &&
  fs.existsSync(stampOf(bundle)) &&
  fs.readFileSync(stampOf(bundle), 'utf8') === hash;

/** @param {Bundle} bundle */
async function make(bundle) {
  // Taken before the build: a source changed meanwhile then counts as changed.
  const hash = hashOf(bundle);
  fs.rmSync(stampOf(bundle), { force: true });
  const [program, ...args] = bundle.command;
  await run(packageProgram(program), args, {
    // Vite would build React's development version for the demo mode of the server.
    env: { ...process.env, NODE_ENV: 'production' },
    remedy: `The ${bundle.name} does not build; the message above names the source. "npm run check:types" says more.`,
  });
  fs.writeFileSync(stampOf(bundle), hash);
}

/** @param {Bundle[]} bundles */
async function buildIfChanged(bundles) {
  const outdated = () => bundles.filter((bundle) => !isCurrent(bundle, hashOf(bundle)));
  if (outdated().length === 0) return;
  await withFileLock(inProject('dist', 'build.lock'), async () => {
    const due = outdated();
    if (due.length === 0) return;
    await step(`Building ${due.map(({ name }) => name).join(' and ')}`, async () => {
      const results = await Promise.allSettled(due.map(make));
      const failed = results.find(({ status }) => status === 'rejected');
      if (failed) throw failed.reason;
    });
  });
}

/** The numeric kernel; its file carries a hash of its sources, so it knows by itself when it is due. */
async function buildKernel() {
  const { compileKernel } = await import('../../../worker/kernel/compileKernel.mjs');
  await withFileLock(inProject('dist', 'build.lock'), () => compileKernel());
}

/** Builds client, server and worker into dist/, each only when its sources changed. */
export async function buildAll() {
  await buildIfChanged([client, server]);
  await buildKernel();
}

/** Builds what a compute host runs. */
export async function buildServer() {
  await buildIfChanged([server]);
  await buildKernel();
}
