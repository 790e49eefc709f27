import './nodeVersion.mjs';
import { buildAll } from './build/bundles.mjs';
import { installPackages } from './packages/npmPackages.mjs';
import { runEntry } from './processes/stopping.mjs';

/** `npm run build`: dist/client, dist/server and dist/worker, as far as their sources changed. */
await runEntry(async () => {
  await installPackages();
  await buildAll();
  process.stdout.write('dist/ is up to date.\n');
  return 0;
});
