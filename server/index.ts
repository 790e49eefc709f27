import { readConfig } from './config.ts';
import type { Config } from './config.ts';
import { isDatabaseAway } from './http/toRefusal.ts';
import { startServer } from './start.ts';
import type { RunningServer } from './start.ts';

/** A stop that takes longer is stuck, and whoever waits for the port has waited enough. */
const STOP_MS = 15_000;

/** The web server as a process: `npm start` and `npm run dev` run this file. */
async function main(): Promise<void> {
  const stopAsked = whenAskedToStop();
  const server = await startOrExplain(readConfigOrExplain());
  process.stdout.write(`${server.greeting}\n`);
  await stopAsked;
  setTimeout(() => {
    process.stderr.write(`Skewlight did not stop within ${STOP_MS / 1000} s and is ended now.\n`);
    process.exit(1);
  }, STOP_MS).unref();
  await server.stop();
  process.stdout.write('Skewlight has stopped.\n');
}

/** From the first moment on, so that a signal during the start is not lost. */
function whenAskedToStop(): Promise<void> {
  return new Promise((resolve) => {
    for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => resolve());
  });
}

function readConfigOrExplain(): Config {
  try {
    return readConfig(process.env);
  } catch (error) {
    return giveUp(error instanceof Error ? error.message : String(error));
  }
}

async function startOrExplain(config: Config): Promise<RunningServer> {
  try {
    return await startServer(config);
  } catch (error) {
    return giveUp(explain(error, config));
  }
}

function explain(error: unknown, { databaseUrl, host, port }: Config): string {
  if (isDatabaseAway(error)) {
    // Without the password that the URL may hold.
    return `no PostgreSQL answers at ${new URL(databaseUrl).host}: is it running, and is DATABASE_URL right?`;
  }
  if (!(error instanceof Error)) return String(error);
  if ('code' in error && error.code === 'EADDRINUSE') {
    return `port ${port} on ${host} is taken: stop what listens there, or choose another PORT.`;
  }
  return error.stack ?? error.message;
}

function giveUp(reason: string): never {
  process.stderr.write(`Skewlight could not start: ${reason}\n`);
  process.exit(1);
}

await main();
