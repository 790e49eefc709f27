import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { healthSchema } from '../../shared/health.ts';
import { runSchema } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { ask, newStack } from './demo.ts';
import { eventually } from './eventually.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { keepAsRun, sweepDrawn, sweepFields } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

const POINTS = 1_000_000;

let site: Site;
let theorist: Visitor;

beforeAll(async () => {
  site = await startSite();
  theorist = await site.visit({ as: 'theorist' });
});

afterAll(async () => site?.stop());

/** Two hundred layers of their own thickness: a million points of it keep any machine busy for a while. */
function longFilm(document: StackDocument): StackDocument {
  const [cap, film] = document.layers;
  const layers = Array.from({ length: 100 }, (_, pair) =>
    [cap, film].flatMap((layer) =>
      layer && 'thicknessNm' in layer
        ? [{ ...layer, id: `${layer.id}-${pair}`, thicknessNm: 0.5 + pair / 100 }]
        : [],
    ),
  ).flat();
  return { ...document, layers };
}

async function pointsDone(page: Page): Promise<number> {
  return Number(await page.getByRole('progressbar').getAttribute('aria-valuenow'));
}

it('goes on with a run over a reload of its page, and cancels it', async () => {
  const { page, context } = theorist;
  const stack = await newStack(context, 'A long film', longFilm);
  await theorist.open(`/stacks/${stack.id}`);
  await sweepFields(page, 'angle').points.fill(String(POINTS));
  await sweepDrawn(page, 'preview');
  await keepAsRun(page);
  await page.getByRole('progressbar').waitFor();
  await eventually(() => pointsDone(page)).toBeGreaterThan(0);

  await page.reload();
  await page.getByRole('progressbar').waitFor();
  await eventually(() => pointsDone(page)).toBeGreaterThan(0);
  const reloadedAt = await pointsDone(page);
  await eventually(() => pointsDone(page)).toBeGreaterThan(reloadedAt);
  expect((await ask(context, '/health', healthSchema)).ok).toBe(true);

  await page.getByRole('button', { name: /^Cancel/ }).click();
  await page.getByText('The run was cancelled').waitFor();
  const { progress } = await ask(context, new URL(page.url()).pathname, runSchema);
  expect(progress.state).toBe('cancelled');
  expect(progress.done).toBeLessThan(POINTS);
  expect(theorist.complaints).toEqual([]);
});
