import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { stackSchema } from '../../shared/stack.ts';
import { ask, newStack } from './demo.ts';
import { eventually } from './eventually.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

let site: Site;
let grower: Visitor;

beforeAll(async () => {
  site = await startSite();
  grower = await site.visit({ as: 'grower' });
});

afterAll(async () => site?.stop());

function focusedLabel(page: Page): Promise<string | null> {
  return page.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? null);
}

/** Goes from stop to stop as somebody without a mouse does. */
async function tabTo(page: Page, label: string): Promise<void> {
  for (let stop = 0; stop < 80; stop += 1) {
    await page.keyboard.press('Tab');
    if ((await focusedLabel(page)) === label) return;
  }
  throw new Error(`The keyboard does not reach "${label}".`);
}

function layerOrder(page: Page): Promise<string[]> {
  return page
    .getByRole('list', { name: 'Layers, from the surface down' })
    .getByRole('listitem')
    .evaluateAll((rows) => rows.map((row) => row.getAttribute('aria-label')?.split(',')[0] ?? ''));
}

it('reorders, undoes, edits and saves without a mouse', async () => {
  const { page, context } = grower;
  const stack = await newStack(context, 'Keyboard only');
  await grower.open(`/stacks/${stack.id}`);
  const asSaved = ['Pt', 'Co', 'Pt', 'Ta', 'SiO₂'];
  await eventually(() => layerOrder(page)).toEqual(asSaved);

  await tabTo(page, 'Move Co, layer 2');
  await page.keyboard.press('Alt+ArrowUp');
  await eventually(() => layerOrder(page)).toEqual(['Co', 'Pt', 'Pt', 'Ta', 'SiO₂']);
  await page.getByText('Moved up').waitFor({ state: 'attached' });
  // The focus goes with the layer, so that the next press moves it on.
  await eventually(() => focusedLabel(page)).toBe('Move Co, layer 1');
  await page.keyboard.press('Control+z');
  await eventually(() => layerOrder(page)).toEqual(asSaved);

  await tabTo(page, 'thickness of Co, layer 2 (nm)');
  await page.keyboard.type('1.2');
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Control+s');
  await page.getByText(/version 2, saved just now/).waitFor();

  const { document, version } = await ask(context, `/stacks/${stack.id}`, stackSchema);
  expect(version).toBe(2);
  expect(document.layers.map(({ id }) => id)).toEqual(['cap', 'film', 'seed', 'adhesion', 'oxide']);
  expect(document.layers[1]).toMatchObject({ id: 'film', thicknessNm: 1.3 });
  expect(grower.complaints).toEqual([]);
});
