import { mkdirSync, statSync } from 'node:fs';
import { buildAll } from '../../server/setup/build/bundles.mjs';
import { provideChromium } from '../../server/setup/packages/chromium.mjs';
import { runEntry } from '../../server/setup/processes/stopping.mjs';
import { inProject } from '../../server/setup/projectPaths.mjs';
import { testDatabases } from '../../server/setup/testing/testDatabases.mjs';
import { testServer } from '../../server/setup/testing/testServer.mjs';
import { demoStack } from './demo.ts';
import { startSite } from './site.ts';
import { sweepDrawn } from './stackPage.ts';
import { fontsShown } from './readings.ts';

/** `npm run screenshot`: the pictures of the README, of the demo as a fresh machine shows it. */
await runEntry(async () => {
  process.env.CHROMIUM_PATH = await provideChromium();
  await buildAll();
  const freshDatabase = await testDatabases(await testServer());
  process.env.TEST_DATABASE_URL = await freshDatabase('screenshot');
  const site = await startSite();
  mkdirSync(inProject('data', 'pictures'), { recursive: true });
  try {
    for (const theme of /** @type {const} */ (['light', 'dark'])) {
      const file = inProject(
        'data',
        'pictures',
        theme === 'light' ? 'stack-page.png' : 'stack-page-dark.png',
      );
      const { context, page, open } = await site.visit({ as: 'lead', theme, height: 800 });
      const stack = await demoStack(context, 'Pt/Co/Pt');
      await open(`/stacks/${stack.id}`);
      await sweepDrawn(page, 200);
      await fontsShown(page);
      await page.screenshot({ path: file });
      process.stdout.write(`${file} (${Math.ceil(statSync(file).size / 1000)} kB)\n`);
    }
  } finally {
    await site.stop();
  }
  return 0;
});
