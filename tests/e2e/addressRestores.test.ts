import { afterAll, beforeAll, expect, it } from 'vitest';
import { demoRunId, demoStack } from './demo.ts';
import { eventually } from './eventually.ts';
import { stripReading } from './readings.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { sweepDrawn, sweepFields, workingPoint } from './stackPage.ts';
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
  const { from, to, points } = sweepFields(page, 'thickness');
  const { wavelength, angle, sLight } = workingPoint(page);
  return {
    wavelength: await wavelength.inputValue(),
    angle: await angle.inputValue(),
    input: await sLight.getAttribute('aria-pressed'),
    swept: await page.getByRole('tab', { selected: true }).innerText(),
    from: await from.inputValue(),
    to: await to.inputValue(),
    points: await points.inputValue(),
    unit: await page.getByLabel('Unit of the angles').inputValue(),
    rotation: await stripReading(page, 'Kerr rotation'),
  };
}

it('restores the stack page from its address, after a reload and for somebody else', async () => {
  const { page, context } = grower;
  const stack = await demoStack(context, 'Pt/Co/Pt');
  await grower.open(`/stacks/${stack.id}`);
  const { wavelength, angle, sLight } = workingPoint(page);
  await wavelength.fill('550');
  await angle.fill('52');
  await sLight.click();
  await sweepDrawn(page, 200);
  await page.getByRole('tab', { name: 'thickness' }).click();
  const { from, to, points } = sweepFields(page, 'thickness');
  await from.fill('0.5');
  await to.fill('12');
  await points.fill('60');
  await page.getByLabel('Unit of the angles').selectOption('mrad');
  await page.waitForURL(/to=12&points=60.*unit=mrad/);
  await sweepDrawn(page, 60);
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
