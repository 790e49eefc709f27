import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { buildAll } from '../build/bundles.mjs';
import { startChild } from '../processes/children.mjs';
import { throwIfStopping, undoAtEnd } from '../processes/stopping.mjs';
import { packageProgram } from '../projectPaths.mjs';
import { SetupError } from '../setupError.mjs';
import { endLeftovers, runMark } from './endLeftovers.mjs';
import { vitestCounts } from './vitestCounts.mjs';

/**
 * @typedef {object} StageResult
 * @property {number} passed
 * @property {number} failed
 */

/** In the order in which they run: the cheapest answer first. */
export const STAGES = /** @type {const} */ (['check', 'unit', 'client', 'api', 'e2e']);
/** @typedef {typeof STAGES[number]} Stage */

/** @param {Stage} stage */
export const needsDatabase = (stage) => stage === 'api' || stage === 'e2e';
/** @param {Stage} stage */
export const needsBrowser = (stage) => stage === 'e2e';

/** Whether it reads growth cards. @param {Stage} stage */
export const readsPdf = (stage) => needsDatabase(stage);

/** @param {string} program @param {string[]} args @param {NodeJS.ProcessEnv} env */
async function succeeds(program, args, env) {
  const { ended } = startChild(program, args, {
    env: { ...env, ...runMark },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  undoAtEnd(async () => endLeftovers());
  const { code } = await ended;
  endLeftovers();
  throwIfStopping();
  return code === 0;
}

/** Types, lint, imports, format, unused exports. @returns {Promise<StageResult>} */
export async function runCheck() {
  return { passed: 0, failed: (await succeeds('npm', ['run', '-s', 'check'], process.env)) ? 0 : 1 };
}

/** A build that fails is a failure to count; the stages after it still run and say more. @returns {Promise<StageResult>} */
export async function runBuild() {
  try {
    await buildAll();
    return { passed: 0, failed: 0 };
  } catch (error) {
    if (!(error instanceof SetupError)) throw error;
    process.stderr.write(`${error.message}\n${error.remedy ?? ''}\n`);
    return { passed: 0, failed: 1 };
  }
}

/**
 * @param {Stage} project of vitest.config.ts
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<StageResult>}
 */
export async function runVitest(project, env) {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'skewlight-test-'));
  undoAtEnd(async () => fs.rmSync(folder, { recursive: true, force: true }));
  const report = path.join(folder, 'report.json');
  const args = [
    'run',
    '--project',
    project,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ];
  const succeeded = await succeeds(packageProgram('vitest'), args, env);
  return vitestCounts(report, succeeded);
}
