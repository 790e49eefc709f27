import { afterAll, beforeAll, expect, it } from 'vitest';
import { capResultSchema } from '../../shared/capDesign.ts';
import { ask, demoGroupId, demoStack } from './demo.ts';
import { endAtFirstFailure } from './endAtFirstFailure.ts';
import { eventually } from './eventually.ts';
import { isDrawn } from './readings.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// From the demo stack to a recommended cap: each part goes on where the one before ended.

endAtFirstFailure();
let site: Site;
let grower: Visitor;

beforeAll(async () => {
  site = await startSite();
  grower = await site.visit({ as: 'grower' });
});

afterAll(async () => site?.stop());

it('fills in the question from the stack', async () => {
  const { page, context } = grower;
  const stack = await demoStack(context, 'Pt/Co/Pt');
  await grower.open(`/groups/${await demoGroupId(context)}/designs/new?kind=cap&stack=${stack.id}`);
  await page.getByRole('group', { name: 'Candidate Pt' }).waitFor();
  expect(await page.getByLabel('1 Pt (cap)').isChecked()).toBe(true);
  expect(await page.getByRole('spinbutton', { name: 'Wavelength' }).inputValue()).toBe('632.8');
});

it('says at the field what is wrong, and keeps what was filled in over a reload', async () => {
  const { page } = grower;
  await page.getByRole('spinbutton', { name: 'Films drawn' }).fill('5');
  await page.getByRole('button', { name: 'Compare the caps' }).click();
  const films = page.getByRole('spinbutton', { name: 'Films drawn' });
  await eventually(() => films.getAttribute('aria-invalid')).toBe('true');
  await page.reload();
  await page.getByText('What you had filled in is back.').waitFor();
  expect(await films.inputValue()).toBe('5');
  await films.fill('100');
  await page.getByRole('spinbutton', { name: 'Points' }).fill('21');
});

it('answers with curves, windows and a ranked table whose numbers are those of the API', async () => {
  const { page, context } = grower;
  await page.getByRole('button', { name: 'Compare the caps' }).click();
  await page.waitForURL(/\/designs\/[^/]+$/);
  await page.getByRole('heading', { name: 'Candidates in order' }).waitFor();
  await eventually(() => isDrawn(page)).toBe(true);
  const id = new URL(page.url()).pathname.split('/').at(-1);
  const result = await ask(context, `/designs/${id}/result`, capResultSchema);
  const first = result.candidates.find((candidate) => candidate.id === result.ranking[0]);
  expect(first?.best).toBeTruthy();
  const rows = page.getByRole('table', { name: 'Candidates from the best to the worst' }).getByRole('row');
  expect(await rows.count()).toBe(1 + result.candidates.length);
  const row = await rows.nth(1).innerText();
  expect(row).toContain(first?.label);
  expect(row).toContain(first?.best?.reason);
  await page.getByLabel('Quantity shown').selectOption('reflectance');
  await page.waitForURL(/show=reflectance/);
  expect(grower.complaints).toEqual([]);
});

it('leads on to a growth card of the best cap', async () => {
  const card = grower.page.getByRole('link', { name: 'Growth card' }).first();
  expect(await card.getAttribute('href')).toMatch(/\/cards\/new\?design=[^&]+&candidate=/);
});
