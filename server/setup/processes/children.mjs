import { spawn } from 'node:child_process';
import { Interrupted, SetupError } from '../setupError.mjs';
import { projectRoot } from '../projectPaths.mjs';

/**
 * Every program that the setup starts. Each gets a process group of its own: a Ctrl-C in the terminal then
 * reaches only this process, which ends the others in order, and a tree such as npm -> sh -> tsc ends as one.
 */

const GRACE_MS = 15_000;
/** Of the output of a program that failed, at its beginning and at its end. */
const END_LINES = 30;

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();
let closed = false;

/** @param {number} pid @param {NodeJS.Signals} signal */
function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // Gone already.
  }
}

/**
 * Asks all children to end and waits; what is still there after 15 s is killed. From the first call on nothing
 * new may be started.
 */
export async function terminateChildren() {
  closed = true;
  await Promise.all(
    [...running].map(
      (child) =>
        new Promise((resolve) => {
          const timer = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), GRACE_MS);
          child.once('close', () => {
            clearTimeout(timer);
            resolve(undefined);
          });
          if (child.pid !== undefined) signalGroup(child.pid, 'SIGTERM');
        }),
    ),
  );
}

/** Allows programs again, for putting things away after the children ended. */
export function releaseChildren() {
  closed = false;
}

/**
 * @typedef {object} StartOptions
 * @property {NodeJS.ProcessEnv} [env] default: the environment of this process
 * @property {string} [cwd] default: the project's folder
 * @property {import('node:child_process').StdioOptions} [stdio] default: output piped, no input
 */

/**
 * Starts a program in its own process group. `ended` resolves with its code (or signal) and never rejects for
 * a program that ran; a program that cannot be started rejects.
 * @param {string} program
 * @param {string[]} args
 * @param {StartOptions} [options]
 */
export function startChild(program, args, options = {}) {
  if (closed) throw new Interrupted();
  const child = spawn(program, args, {
    cwd: projectRoot,
    stdio: ['ignore', 'pipe', 'pipe'],
    ...options,
    detached: true,
  });
  running.add(child);
  const ended = new Promise((resolve, reject) => {
    child.once('error', (error) => {
      running.delete(child);
      reject(new SetupError(`Cannot run ${program}: ${error.message}`));
    });
    child.once('exit', () => {
      // What the leader left behind in its group keeps the pipes open and would outlive this process.
      signalGroup(child.pid, 'SIGKILL');
    });
    child.once('close', (code, signal) => {
      running.delete(child);
      resolve({ code, signal });
    });
  });
  return { child, ended };
}

/** Some programs name the cause first, others last: keep both ends. @param {string} output */
function shorten(output) {
  const lines = output.trim().split('\n');
  if (lines.length <= 2 * END_LINES) return lines.join('\n');
  return [...lines.slice(0, END_LINES), '...', ...lines.slice(-END_LINES)].join('\n');
}

/**
 * Runs a program to its end and returns what it printed.
 * @param {string} program
 * @param {string[]} args
 * @param {StartOptions & { remedy?: string }} [options] remedy: what to do when it fails
 * @returns {Promise<string>} standard output
 */
export async function run(program, args, { remedy, ...options } = {}) {
  const { child, ended } = startChild(program, args, options);
  let output = '';
  let all = '';
  child.stdout?.on('data', (chunk) => {
    output += chunk;
    all += chunk;
  });
  child.stderr?.on('data', (chunk) => {
    all += chunk;
  });
  const { code, signal } = await ended;
  if (code === 0) return output;
  if (closed) throw new Interrupted();
  throw new SetupError(`${program} ${args[0] ?? ''} ended with ${code ?? signal}:\n${shorten(all)}`, remedy);
}
