import './nodeVersion.mjs';
import { randomBytes } from 'node:crypto';
import { provideChromium } from './packages/chromium.mjs';
import { installPackages } from './packages/npmPackages.mjs';
import { providePoppler } from './packages/poppler.mjs';
import { runEntry } from './processes/stopping.mjs';
import { SetupError } from './setupError.mjs';
import { seconds } from './step.mjs';
import { endLeftovers } from './testing/endLeftovers.mjs';
import {
  needsBrowser,
  needsDatabase,
  readsPdf,
  runBuild,
  runCheck,
  runVitest,
  STAGES,
} from './testing/stages.mjs';
import { testDatabases } from './testing/testDatabases.mjs';
import { testServer } from './testing/testServer.mjs';

/** The stages named on the command line, in their own order; all of them when none is named. */
function chosenStages() {
  const named = process.argv.slice(2);
  const unknown = named.find((name) => !STAGES.includes(name));
  if (unknown !== undefined) {
    throw new SetupError(`There is no test stage "${unknown}".`, `Stages: npm test -- ${STAGES.join(' ')}`);
  }
  return STAGES.filter((stage) => named.length === 0 || named.includes(stage));
}

/** @param {import('./testing/stages.mjs').Stage[]} stages */
async function provideWhatIsNeeded(stages) {
  endLeftovers();
  await installPackages();
  const chromium = stages.some(needsBrowser) ? await provideChromium() : undefined;
  if (stages.some(readsPdf)) await providePoppler();
  const freshDatabase = stages.some(needsDatabase) ? await testDatabases(await testServer()) : undefined;
  return { chromium, freshDatabase };
}

/** @param {string} stage @param {Awaited<ReturnType<typeof provideWhatIsNeeded>>} provided */
async function stageEnvironment(stage, { chromium, freshDatabase }) {
  // NODE_ENV is not passed on: with "production" from a CI, React would leave out what its tests need.
  const environment = { ...process.env, NODE_ENV: 'test' };
  environment.SESSION_SECRET ||= randomBytes(32).toString('hex');
  if (chromium) environment.CHROMIUM_PATH = chromium;
  if (freshDatabase && needsDatabase(stage)) {
    environment.TEST_DATABASE_URL = await freshDatabase(stage);
    // Whoever reads the usual variable must not reach a database with somebody's work in it.
    environment.DATABASE_URL = environment.TEST_DATABASE_URL;
  }
  return environment;
}

/** @param {{ stage: string, passed: number, failed: number, took: number }[]} rows */
function printTable(rows) {
  process.stdout.write(
    `\n${'stage'.padEnd(8)}${'passed'.padStart(8)}${'failed'.padStart(8)}${'time'.padStart(10)}\n`,
  );
  for (const { stage, passed, failed, took } of rows) {
    const cells = [String(passed).padStart(8), String(failed).padStart(8), seconds(took).padStart(10)];
    process.stdout.write(`${stage.padEnd(8)}${cells.join('')}\n`);
  }
}

/** `npm test`, or for some stages `npm test -- unit api`. The last line is "N passed, N failed". */
await runEntry(async () => {
  const stages = chosenStages();
  const provided = await provideWhatIsNeeded(stages);
  const rows = [];
  /** @param {string} stage @param {() => Promise<import('./testing/stages.mjs').StageResult>} work */
  const record = async (stage, work) => {
    const started = Date.now();
    rows.push({ stage, ...(await work()), took: Date.now() - started });
  };
  if (stages.some(needsDatabase)) await record('build', runBuild);
  for (const stage of stages) {
    process.stdout.write(`\n== ${stage}\n`);
    await record(stage, async () =>
      stage === 'check' ? runCheck() : runVitest(stage, await stageEnvironment(stage, provided)),
    );
  }
  printTable(rows);
  const passed = rows.reduce((sum, row) => sum + row.passed, 0);
  const failed = rows.reduce((sum, row) => sum + row.failed, 0);
  process.stdout.write(`\n${passed} passed, ${failed} failed\n`);
  return failed === 0 ? 0 : 1;
});
