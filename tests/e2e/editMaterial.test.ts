import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { materialSchema } from '../../shared/material.ts';
import { ask, demoGroupId } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// A person makes a material of a formula, looks at it, saves it, and changes it into a second version.

const NAME = `Fused silica ${process.pid}`;

/** I. H. Malitson, J. Opt. Soc. Am. 55, 1205 (1965), eq. (1): n^2 - 1 as three terms; the C are 0.0684043^2 and so on. */
const MALITSON = [
  [0.6961663, 0.0684043 ** 2],
  [0.4079426, 0.1162414 ** 2],
  [0.8974794, 9.896161 ** 2],
] as const;

/** Of a stored material, not of the form for a new one. */
const PAGE_OF_MATERIAL = /\/materials\/(?!new)[^/]+$/;

let site: Site;
let editor: Visitor;
let groupId: string;
let materialId: string;

beforeAll(async () => {
  site = await startSite();
  editor = await site.visit({ as: 'lead' });
  groupId = await demoGroupId(editor.context);
});

afterAll(async () => site?.stop());

const index = (page: Page) => page.getByRole('region', { name: /^Refractive index/ });

async function typeTerm(page: Page, position: number, b: number, c: number): Promise<void> {
  const term = page.getByRole('group', { name: `term ${position}`, exact: true });
  await term.getByLabel('B', { exact: true }).fill(String(b));
  await term.getByLabel('C', { exact: true }).fill(String(c));
}

it('makes a material of a Sellmeier formula, shows its curve before it is saved, and stores it', async () => {
  const { page } = editor;
  await editor.open(`/groups/${groupId}/materials/new`);
  await page.getByLabel('Name', { exact: true }).fill(NAME);
  await page.getByLabel('Formula', { exact: true }).fill('SiO2');
  await page.getByLabel('n and k are given by').selectOption('sellmeier');
  for (const [position, [b, c]] of MALITSON.entries()) {
    if (position > 0) await page.getByRole('button', { name: 'Add a term' }).click();
    await typeTerm(page, position + 1, b, c);
  }
  await page.getByText('As a stack will use it').waitFor();
  const plot = page.getByRole('slider', { name: `Preview of n and k of ${NAME}` });
  await plot.focus();
  await plot.press('Home');
  // 1.4701 at 400 nm: the same formula, worked out by hand; Malitson tabulates 1.470 at 0.4 um.
  await eventuallyReads(plot, /n 1\.4701/);

  await page.getByRole('button', { name: 'Save material' }).click();
  await page.getByRole('alert').filter({ hasText: 'indexSource.citation' }).waitFor();
  await index(page)
    .getByLabel('Citation (required)')
    .fill('I. H. Malitson, J. Opt. Soc. Am. 55, 1205 (1965)');
  await page.getByRole('button', { name: 'Save material' }).click();
  await page.waitForURL(PAGE_OF_MATERIAL);
  await page.getByRole('heading', { level: 1, name: NAME }).waitFor();
  materialId = page.url().split('/').at(-1) ?? '';
  const stored = await ask(editor.context, `/materials/${materialId}`, materialSchema);
  expect(stored.content.index).toMatchObject({
    kind: 'model',
    model: { name: 'sellmeier', constant: 1, terms: MALITSON.map(([b, cUm2]) => ({ b, cUm2 })) },
  });
  expect(editor.complaints).toEqual([]);
});

it('keeps unsaved edits over a reload, warns before they are left, and saves them as version 2', async () => {
  const { page } = editor;
  await editor.open(`/materials/${materialId}/edit`);
  await page.getByLabel('Valid to').fill('2000');
  await page.getByText('Unsaved changes').waitFor();
  await page.getByRole('link', { name: 'Materials' }).click();
  const question = page.getByRole('dialog', { name: 'Leave with unsaved changes?' });
  await question.getByRole('button', { name: 'Stay' }).click();
  page.once('dialog', (dialog) => void dialog.accept());
  await page.reload();
  await page.getByText('Your unsaved changes from before are back.').waitFor();
  expect(await page.getByLabel('Valid to').inputValue()).toBe('2000');

  await page.getByLabel('What changes, and why').fill('Known farther into the infrared');
  await page.getByRole('button', { name: 'Save as version 2' }).click();
  await page.waitForURL(PAGE_OF_MATERIAL);
  await page.getByText('version 2').first().waitFor();
  await page.getByText('Known farther into the infrared').waitFor();
  const stored = await ask(editor.context, `/materials/${materialId}`, materialSchema);
  expect(stored.version).toBe(2);
  expect(stored.rangeNm).toEqual([400, 2000]);
  expect(editor.complaints).toEqual([]);
});

it('does not lose edits to somebody who was faster', async () => {
  const { page } = editor;
  await editor.open(`/materials/${materialId}/edit`);
  const { content } = await ask(editor.context, `/materials/${materialId}`, materialSchema);
  const grower = await site.visit({ as: 'grower' });
  const theirs = { ...content, indexSource: { ...content.indexSource, sample: 'bulk' } };
  const body = { version: 2, note: 'The sample is named', content: theirs };
  await ask(grower.context, `/materials/${materialId}/versions`, materialSchema, body);

  await page.getByLabel('Valid from').fill('300');
  await page.getByRole('button', { name: 'Save as version 3' }).click();
  await page.getByText(/made version 3 of this material while you were editing/).waitFor();
  expect(await page.getByLabel('Valid from').inputValue()).toBe('300');
  await page.getByRole('button', { name: 'Save mine as version 4' }).click();
  await page.waitForURL(PAGE_OF_MATERIAL);
  const stored = await ask(editor.context, `/materials/${materialId}`, materialSchema);
  expect([stored.version, ...stored.rangeNm]).toEqual([4, 300, 2000]);
});

/** The value that a plot reads out to a screen reader, once it says so. */
async function eventuallyReads(plot: ReturnType<Page['locator']>, wanted: RegExp): Promise<void> {
  await expect.poll(() => plot.getAttribute('aria-valuetext')).toMatch(wanted);
}
