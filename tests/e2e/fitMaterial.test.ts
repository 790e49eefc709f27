import { afterAll, beforeAll, expect, it } from 'vitest';
import { materialSchema } from '../../shared/material.ts';
import { ask } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// A theorist fits a Drude-Lorentz sum to the table of gold and keeps it as a material of the group.

let site: Site;
let theorist: Visitor;

beforeAll(async () => {
  site = await startSite();
  theorist = await site.visit({ as: 'theorist' });
});

afterAll(async () => site?.stop());

it('fits free electrons and two lines to gold, with uncertainties, and keeps them as fitted', async () => {
  const { page, context } = theorist;
  await theorist.open('/materials/au-johnson-1972');
  await page.getByRole('link', { name: 'Copy into this group and edit' }).click();
  await page.getByLabel('n and k are given by').selectOption({ label: 'a sum of oscillators' });
  const index = page.getByRole('region', { name: /^Refractive index/ });
  await index.getByRole('button', { name: 'Add Drude' }).click();
  await index.getByRole('button', { name: 'Add Lorentz' }).click();
  await index.getByLabel('E₀, centre').first().fill('3');
  await index.getByText('Fit these values to a table').click();
  await index.getByLabel('The data: a material with a table of n and k').selectOption('au-johnson-1972');
  await index.getByRole('button', { name: 'Fit', exact: true }).click();
  const parameters = index.getByRole('table', { name: 'Fitted parameters' });
  await parameters.waitFor();
  expect(await parameters.getByRole('row').count()).toBe(10);
  expect(await parameters.innerText()).toContain('±');
  await index.getByRole('button', { name: 'Use these values' }).click();
  await page.getByLabel('Name', { exact: true }).fill('Gold, Drude and two lines');
  await page.getByRole('button', { name: 'Save material' }).click();
  await page.getByRole('heading', { level: 1, name: /Gold, Drude and two lines/ }).waitFor();

  const id = page.url().split('/').at(-1) ?? '';
  const { content } = await ask(context, `/materials/${id}`, materialSchema);
  expect(content.indexSource.confidence).toBe('fitted');
  expect(content.indexSource.citation).toContain('Johnson');
  if (content.index.kind !== 'model' || content.index.model.name !== 'oscillators') {
    throw new Error('it is no sum of oscillators');
  }
  const plasmaEv = content.index.model.terms.flatMap((term) =>
    term.kind === 'drude' ? [term.plasmaEv] : [],
  );
  // From memory: the free electrons of gold have a plasma energy near 9 eV.
  expect(plasmaEv).toHaveLength(1);
  expect(plasmaEv[0]).toBeGreaterThan(8.5);
  expect(plasmaEv[0]).toBeLessThan(9.5);
  expect(theorist.complaints).toEqual([]);
});
