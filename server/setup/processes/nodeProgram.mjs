import { startChild } from './children.mjs';

const preload = new URL('./exitWithParent.mjs', import.meta.url).href;

/**
 * Starts a Node program that ends with this process, however this process ends.
 * @param {string[]} args script and arguments
 * @param {NodeJS.ProcessEnv} env
 * @param {'inherit' | 'pipe'} output
 */
export function startNodeProgram(args, env, output) {
  return startChild(process.execPath, ['--import', preload, ...args], {
    env,
    stdio: ['ignore', output, output, 'ipc'],
  });
}
