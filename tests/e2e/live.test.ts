import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { newStack } from './demo.ts';
import { eventually } from './eventually.ts';
import { stripReading } from './readings.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { thicknessOf } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

/** The page has two under way (src/lib/latestWins.ts); one that it hung up on may end after the next has begun. */
const MOST_UNDER_WAY = 3;

let site: Site;
let grower: Visitor;

beforeAll(async () => {
  site = await startSite();
  grower = await site.visit({ as: 'grower' });
});

afterAll(async () => site?.stop());

/** Curves that the page has asked, and how many of them were under way at once at most. */
function countCurves(page: Page) {
  const count = { asked: 0, underWay: 0, most: 0 };
  page.on('request', (request) => {
    if (!request.url().endsWith('/live-curve')) return;
    count.asked += 1;
    count.underWay += 1;
    count.most = Math.max(count.most, count.underWay);
  });
  const ended = (request: { url(): string }) => {
    if (request.url().endsWith('/live-curve')) count.underWay -= 1;
  };
  page.on('requestfinished', ended);
  page.on('requestfailed', ended);
  return count;
}

it('redraws while the face of a layer is dragged, and goes back on Escape and undo', async () => {
  const { page, context } = grower;
  const stack = await newStack(context, 'Dragged');
  await grower.open(`/stacks/${stack.id}`);
  const rotation = () => stripReading(page, 'Kerr rotation');
  const thickness = () => thicknessOf(page, 'Pt, layer 1').inputValue().then(Number);
  await eventually(rotation).not.toBeNaN();
  await page.getByRole('region', { name: 'Angles of this film' }).waitFor();
  const [thin, before] = [await rotation(), await thickness()];
  const curves = countCurves(page);

  const handle = (await page.locator('[data-thickness-handle="cap"]').boundingBox())!;
  const [x, y] = [handle.x + handle.width / 2, handle.y + handle.height / 2];
  await page.mouse.move(x, y);
  await page.mouse.down();
  for (let step = 1; step <= 12; step += 1) await page.mouse.move(x, y + 3 * step);
  await eventually(thickness).toBeGreaterThan(before + 1);
  // A thicker platinum cap takes signal away: the strip follows before the button is let go.
  await eventually(rotation).toBeLessThan(thin);
  expect(curves.asked).toBeGreaterThan(0);
  expect(curves.most).toBeLessThanOrEqual(MOST_UNDER_WAY);
  await page.keyboard.press('Escape');
  await eventually(thickness).toBe(before);
  await page.mouse.up();
  await eventually(rotation).toBe(thin);

  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x, y + 10);
  await page.mouse.move(x, y + 20);
  await page.mouse.up();
  await eventually(thickness).toBeGreaterThan(before);
  // The whole drag is one step.
  await page.getByRole('button', { name: 'Undo' }).click();
  await eventually(thickness).toBe(before);
  expect(grower.complaints).toEqual([]);
});

it('does the same by the arrow keys of the thickness field', async () => {
  const { page, context } = grower;
  const stack = await newStack(context, 'Stepped');
  await grower.open(`/stacks/${stack.id}`);
  const rotation = () => stripReading(page, 'Kerr rotation');
  await eventually(rotation).not.toBeNaN();
  const thin = await rotation();
  const curves = countCurves(page);
  const field = thicknessOf(page, 'Pt, layer 1');
  await field.focus();
  for (let press = 0; press < 4; press += 1) await page.keyboard.press('ArrowUp');
  await eventually(rotation).toBeLessThan(thin);
  await eventually(() => curves.underWay).toBe(0);
  expect(curves.asked).toBeGreaterThan(0);
  expect(curves.most).toBeLessThanOrEqual(MOST_UNDER_WAY);
  expect(grower.complaints).toEqual([]);
});
