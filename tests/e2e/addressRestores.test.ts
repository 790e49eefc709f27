import { afterAll, beforeAll, expect, it } from 'vitest';
import { demoRunId, demoStack } from './demo.ts';
import { eventually } from './eventually.ts';
import { stripReading } from './readings.ts';
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

/** What somebody set on the stack page, as the page shows it. */
async function shownView({ page }: Visitor) {
  return {
    wavelength: await page.getByLabel('wavelength (nm)').inputValue(),
    angle: await page.getByLabel('angle of incidence (°)').inputValue(),
    input: await page.getByRole('button', { name: 's light' }).getAttribute('aria-pressed'),
    swept: await page.getByRole('tab', { selected: true }).innerText(),
    from: await page.getByLabel('thickness from (nm)').inputValue(),
    to: await page.getByLabel('thickness to (nm)').inputValue(),
    points: await page.getByLabel('points of the run (points)').inputValue(),
    unit: await page.getByLabel('Unit of the angles').inputValue(),
    rotation: await stripReading(page, 'Kerr rotation'),
  };
}

it('restores the stack page from its address, after a reload and for somebody else', async () => {
  const { page, context } = grower;
  const stack = await demoStack(context, 'Pt/Co/Pt');
  await grower.open(`/stacks/${stack.id}`);
  await page.getByLabel('wavelength (nm)').fill('550');
  await page.getByLabel('angle of incidence (°)').fill('52');
  await page.getByRole('button', { name: 's light' }).click();
  await page.getByText(/^200 points, /).waitFor();
  await page.getByRole('tab', { name: 'thickness' }).click();
  await page.getByLabel('thickness from (nm)').fill('0.5');
  await page.getByLabel('thickness to (nm)').fill('12');
  await page.getByLabel('points of the run (points)').fill('60');
  await page.getByLabel('Unit of the angles').selectOption('mrad');
  await page.waitForURL(/to=12&points=60.*unit=mrad/);
  await page.getByText(/^60 points, /).waitFor();
  await eventually(() => stripReading(page, 'Kerr rotation')).not.toBeNaN();
  const before = await shownView(grower);
  expect(before).toMatchObject({
    wavelength: '550',
    angle: '52',
    input: 'true',
    swept: 'thickness',
    to: '12',
  });

  const colleague = await site.visit({ as: 'guest' });
  const copied = page.url();
  await page.reload();
  await colleague.open(copied);
  for (const visitor of [grower, colleague]) {
    await eventually(() => shownView(visitor)).toEqual(before);
  }
  expect([...grower.complaints, ...colleague.complaints]).toEqual([]);
});

it('restores how a run is shown, and comes back to an address after the sign-in', async () => {
  const stranger = await site.visit();
  const { page } = stranger;
  const address = `/runs/${await demoRunId(grower.context)}?unit=deg&light=s`;
  await stranger.open(address);
  await page.getByRole('button', { name: /^guest@northgate\.example/ }).click();
  await page.waitForURL(`**${address}`);
  await page.getByText('Values at angle 30°').waitFor();
  expect(await page.getByLabel('Unit of the angles').inputValue()).toBe('deg');
  expect(await page.getByLabel('Light shown').inputValue()).toBe('s');
  await page.getByLabel('Unit of the angles').selectOption('mdeg');
  await page.waitForURL(/^(?!.*unit=deg)/);
});
