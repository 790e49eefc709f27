import './nodeVersion.mjs';
import { awaitServerPort } from './awaitPort.mjs';
import { installPackages } from './packages/npmPackages.mjs';
import { runUntilStopped } from './processes/runUntilStopped.mjs';
import { runEntry } from './processes/stopping.mjs';
import { serverEnvironment } from './serverEnvironment.mjs';

/**
 * `npm run dev`: the server from its sources, started again at each change, and beside it Vite's server for the
 * client, which hands /api on to the first.
 */
await runEntry(async () => {
  await awaitServerPort();
  await installPackages();
  const env = await serverEnvironment();
  return runUntilStopped([
    {
      name: 'tsx',
      // Without --clear-screen=false a restart would wipe what Vite printed.
      args: ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/index.ts'],
      env,
      prefix: '[server]',
    },
    {
      name: 'vite',
      args: ['node_modules/vite/bin/vite.js', '--clearScreen', 'false'],
      env,
      prefix: '[client]',
    },
  ]);
});
