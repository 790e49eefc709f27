import { afterAll, beforeAll, expect, it } from 'vitest';
import { materialSchema } from '../../shared/material.ts';
import type { MaterialDraft } from '../../shared/materialEdit.ts';
import { runSchema } from '../../shared/run.ts';
import { stackSchema } from '../../shared/stack.ts';
import { ask, demoGroupId, newStack } from './demo.ts';
import { endAtFirstFailure } from './endAtFirstFailure.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { keepAsRun } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

// A material of the group gets a second version: the stack offers it, the stored run keeps the first.

endAtFirstFailure();

let site: Site;
let theorist: Visitor;
let materialId: string;
let stackId: string;
let runId: string;

const source = {
  citation: 'Invented for a test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
} as const;

const contentOf = (n: number): MaterialDraft => ({
  index: { kind: 'table', wavelengthsNm: [300, 1000], n: [n, n], k: [4, 4] },
  indexSource: source,
  voigt: null,
  voigtSource: null,
});

beforeAll(async () => {
  site = await startSite();
  theorist = await site.visit({ as: 'theorist' });
  const { context } = theorist;
  const naming = { name: 'Cap of ours', formula: 'Pt', class: 'noble' };
  const path = `/groups/${await demoGroupId(context)}/materials`;
  materialId = (await ask(context, path, materialSchema, { ...naming, content: contentOf(2) })).id;
  const stack = await newStack(context, 'Under our cap', (document) => ({
    ...document,
    layers: document.layers.map((layer, place) =>
      place === 0 && 'medium' in layer ? { ...layer, medium: { material: materialId } } : layer,
    ),
  }));
  stackId = stack.id;
});

afterAll(async () => site?.stop());

const capVersion = async () => {
  const { document } = await ask(theorist.context, `/stacks/${stackId}`, stackSchema);
  const [cap] = document.layers;
  return cap && 'medium' in cap ? cap.medium.version : undefined;
};
const usedVersions = async (id: string) => {
  const { materials } = await ask(theorist.context, `/runs/${id}`, runSchema);
  return materials.filter((one) => one.id === materialId).map(({ version }) => version);
};

it('keeps a run of the first version', async () => {
  const { page } = theorist;
  await theorist.open(`/stacks/${stackId}`);
  await keepAsRun(page);
  runId = page.url().split('/').at(-1) ?? '';
  expect(await usedVersions(runId)).toEqual([1]);
});

it('makes a second version in the editor, with its reason', async () => {
  const { page } = theorist;
  await theorist.open(`/materials/${materialId}/edit`);
  await page.getByLabel('n, row 1', { exact: true }).fill('2.5');
  await page.getByLabel('What changes, and why').fill('measured again');
  await page.getByRole('button', { name: 'Save as version 2' }).click();
  await page.getByText('measured again').waitFor();
});

it('offers the second version in the stack and takes it only when told', async () => {
  const { page } = theorist;
  await theorist.open(`/stacks/${stackId}`);
  await page.getByText('version 1; version 2 exists').first().waitFor();
  expect(await capVersion()).toBe(1);
  await page.getByRole('link', { name: 'what changed' }).first().click();
  await page.getByText('1 changed').first().waitFor();
  await page.goBack();
  await page.getByRole('button', { name: 'Take version 2' }).first().click();
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.getByText(/version 2, saved just now/).waitFor();
  expect(await capVersion()).toBe(2);
});

it('repeats the run with the version that it was made with', async () => {
  const { page } = theorist;
  await theorist.open(`/runs/${runId}`);
  const rerun = page.getByRole('button', { name: 'Rerun with today’s solver' });
  await rerun.first().click();
  await page.waitForURL((url) => !url.pathname.endsWith(runId));
  expect(await usedVersions(page.url().split('/').at(-1) ?? '')).toEqual([1]);
});

it('cannot be deleted while they use it, and says who does', async () => {
  const { page } = theorist;
  await theorist.open(`/materials/${materialId}`);
  await page.getByRole('button', { name: /^Delete/ }).click();
  const uses = page.getByText('Under our cap');
  await uses.first().waitFor();
  const { version } = await ask(theorist.context, `/materials/${materialId}`, materialSchema);
  expect(version).toBe(2);
  expect(theorist.complaints.filter((complaint) => !complaint.includes('409'))).toEqual([]);
});
