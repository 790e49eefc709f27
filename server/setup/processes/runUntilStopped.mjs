import { createInterface } from 'node:readline';
import { terminateChildren } from './children.mjs';
import { startNodeProgram } from './nodeProgram.mjs';
import { stopRequested } from './stopping.mjs';

/**
 * @typedef {object} Program
 * @property {string} name for messages
 * @property {string[]} args script and arguments for Node
 * @property {NodeJS.ProcessEnv} env
 * @property {string} [prefix] printed before each line of its output; without one the output passes unchanged
 */

/** @param {import('node:stream').Readable} stream @param {NodeJS.WriteStream} target @param {string} prefix */
function prefixLines(stream, target, prefix) {
  createInterface({ input: stream }).on('line', (line) => target.write(`${prefix} ${line}\n`));
}

/** @param {Program} program */
async function runProgram({ name, args, env, prefix }) {
  const { child, ended } = startNodeProgram(args, env, prefix ? 'pipe' : 'inherit');
  if (prefix) {
    prefixLines(child.stdout, process.stdout, prefix);
    prefixLines(child.stderr, process.stderr, prefix);
  }
  const { code, signal } = await ended;
  // A program without a handler of its own ends by the signal itself; one that had to be killed is a failure.
  return { name, code, signal, orderly: code === 0 || code === 143 || signal === 'SIGTERM' };
}

/**
 * Runs programs that are meant to stay, until a signal stops them or one of them ends by itself.
 * @param {Program[]} programs
 * @returns {Promise<number>} exit code: 0 after a signal and an orderly end, else not 0
 */
export async function runUntilStopped(programs) {
  const endings = programs.map(runProgram);
  const first = await Promise.race(endings);
  if (stopRequested()) {
    const all = await Promise.all(endings);
    return all.every(({ orderly }) => orderly) ? 0 : 1;
  }
  process.stderr.write(`${first.name} ended by itself (${first.signal ?? `code ${first.code}`}).\n`);
  await terminateChildren();
  return first.code || 1;
}
