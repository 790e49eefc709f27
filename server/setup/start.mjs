import './nodeVersion.mjs';
import { awaitServerPort } from './awaitPort.mjs';
import { buildAll } from './build/bundles.mjs';
import { installPackages } from './packages/npmPackages.mjs';
import { runUntilStopped } from './processes/runUntilStopped.mjs';
import { runEntry } from './processes/stopping.mjs';
import { serverEnvironment } from './serverEnvironment.mjs';

/**
 * `npm start`: from a fresh clone to the running application in one command. The server itself migrates, seeds,
 * serves and computes; it prints the address and the demo sign-ins.
 */
await runEntry(async () => {
  await awaitServerPort();
  await installPackages();
  await buildAll();
  const environment = await serverEnvironment();
  return runUntilStopped([
    {
      name: 'The server',
      // Five isolates with V8's usual young generation hold 150 MB at rest that nothing here needs.
      args: ['--enable-source-maps', '--max-semi-space-size=2', 'dist/server/index.js'],
      env: environment,
    },
  ]);
});
