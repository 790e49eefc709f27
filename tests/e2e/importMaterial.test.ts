import { afterAll, beforeAll, expect, it } from 'vitest';
import { materialSchema } from '../../shared/material.ts';
import { ask, demoGroupId } from './demo.ts';
import { endAtFirstFailure } from './endAtFirstFailure.ts';
import { eventually } from './eventually.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// Somebody pastes a table of a paper that uses exp(+iwt) and finds it as a material of the group.

endAtFirstFailure();

let site: Site;
let grower: Visitor;
let group: string;
let materialId: string;

beforeAll(async () => {
  site = await startSite();
  grower = await site.visit({ as: 'grower' });
  group = await demoGroupId(grower.context);
});

afterAll(async () => site?.stop());

/** eps = N^2 of these N = n - ik in exact arithmetic: (2 - 3i)^2 = -5 - 12i, and so on. */
const points = [
  { energyEv: 1.5, n: 2, k: 3 },
  { energyEv: 2, n: 1.5, k: 2.5 },
  { energyEv: 2.5, n: 1, k: 2 },
  { energyEv: 3, n: 1.5, k: 1 },
];
/** hc/e in eV nm, CODATA 2018. */
const EV_NM = 1239.841984;

const comma = (value: number) => String(value).replace('.', ',');
const table = [
  '# an invented metal, exp(+iwt)',
  'energy (eV); eps1; eps2',
  ...points.map(({ energyEv, n, k }) => [energyEv, n * n - k * k, -2 * n * k].map(comma).join('; ')),
].join('\n');

const step = (number: number) => grower.page.getByRole('region', { name: new RegExp(`^Step ${number}:`) });

it('reads a pasted table with semicolons and decimal commas', async () => {
  const { page } = grower;
  await grower.open(`/groups/${group}/materials/import`);
  await page.getByText('At most 20 MB').waitFor();
  await page.getByRole('tab', { name: 'Paste a table' }).click();
  await page.getByLabel('Table', { exact: true }).fill(table);
  await page.getByRole('button', { name: 'Read this table' }).click();
  await step(1)
    .getByText('4 rows, semicolons between the columns, decimal comma, header in line 2.')
    .waitFor();
  expect(await page.getByLabel('Meaning of column 1').inputValue()).toBe('spectral');
  expect(await page.getByLabel('Unit of column 1').inputValue()).toBe('eV');
  expect(await page.getByLabel('Meaning of column 2').inputValue()).toBe('eps1');
  expect(await page.getByLabel('Meaning of column 3').inputValue()).toBe('eps2');
});

it('chooses no sign habit by itself, and says where a wrong one is mended', async () => {
  const { page } = grower;
  const habits = step(3).getByRole('radio');
  expect(await habits.count()).toBe(2);
  expect(await habits.evaluateAll((all) => all.filter((one) => one.matches(':checked')).length)).toBe(0);
  await step(4).getByText('one question is still open').waitFor();
  await habits.nth(0).check();
  await step(4).getByRole('link', { name: 'To the signs' }).waitFor();
  await page.getByRole('radio', { name: 'exp(+iωt)' }).check();
  await step(4).getByText('4 rows converted').waitFor();
});

it('is still there after a reload', async () => {
  const { page } = grower;
  await page.reload();
  await step(4).getByText('4 rows converted').waitFor();
  expect(await page.getByRole('radio', { name: 'exp(+iωt)' }).isChecked()).toBe(true);
});

it('asks for the source and makes a material of the converted constants', async () => {
  const { page } = grower;
  await page.getByRole('button', { name: 'Create material' }).click();
  await step(5).getByText('Must not be empty: say where the numbers come from').waitFor();
  await page.getByLabel('Name', { exact: true }).fill('Invented metal');
  await page.getByLabel('Formula', { exact: true }).fill('Im');
  await page.getByLabel('Class', { exact: true }).selectOption('noble');
  await page.getByLabel('Citation (required)').fill('Invented for a test');
  await page.getByLabel('Confidence (required)').selectOption('invented for the demo');
  await page.getByRole('button', { name: 'Create material' }).click();
  await page.getByRole('heading', { level: 1, name: 'Im, Invented metal' }).waitFor();
  await page.getByText('Invented for a test').first().waitFor();

  materialId = page.url().split('/').at(-1) ?? '';
  const { content, groupId } = await ask(grower.context, `/materials/${materialId}`, materialSchema);
  expect(groupId).toBe(group);
  if (content.index.kind !== 'table') throw new Error('the material is not a table');
  const { wavelengthsNm, n, k } = content.index;
  const ascending = [...points].reverse();
  ascending.forEach((point, place) => {
    expect(wavelengthsNm[place]).toBeCloseTo(EV_NM / point.energyEv, 9);
    expect(n[place]).toBeCloseTo(point.n, 12);
    expect(k[place]).toBeCloseTo(point.k, 12);
  });
  expect(wavelengthsNm).toHaveLength(4);
  expect(content.origin?.index?.mapping.habits.time).toBe('exp(+iwt)');
});

it('uploads a file and shows why it is refused, with nothing lost', async () => {
  const { page } = grower;
  await grower.open(`/groups/${group}/materials/import?for=${materialId}`);
  await page.getByText('the table makes version 2').waitFor();
  const file = {
    name: 'picture.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 1, 2]),
  };
  await page.getByLabel('Choose a file').setInputFiles(file);
  await page.getByText('picture.csv cannot be read').waitFor();
  await eventually(() => page.getByLabel('Choose a file').isVisible()).toBe(true);
});

it('adds Q from Kerr angles to the material as a new version', async () => {
  const { page } = grower;
  const rows = [
    'nm\trotation (deg)\tellipticity (deg)',
    ...[450, 500, 600, 700].map((nm) => `${nm}\t0.2\t-0.1`),
  ];
  const file = { name: 'kerr.tsv', mimeType: 'text/plain', buffer: Buffer.from(rows.join('\n')) };
  await page.getByLabel('Choose a file').setInputFiles(file);
  await step(2).getByText('N is that of Im, Invented metal').waitFor();
  await page.getByLabel('Meaning of column 2').selectOption('rotation');
  await page.getByLabel('Meaning of column 3').selectOption('ellipticity');
  await page.getByRole('radio', { name: 'into the film' }).check();
  await page.getByRole('radio', { name: 'counter-clockwise', exact: true }).first().check();
  await page.getByRole('radio', { name: 'counter-clockwise', exact: true }).last().check();
  await step(4).getByText('Converted, not measured as Q').waitFor();
  await page.getByLabel('Citation (required)').fill('Also invented');
  await page.getByLabel('Confidence (required)').selectOption('measured');
  await page.getByRole('button', { name: 'Make version 2' }).click();
  await page.getByText('version 2', { exact: true }).first().waitFor();
  const { content, version } = await ask(grower.context, `/materials/${materialId}`, materialSchema);
  expect(version).toBe(2);
  expect(content.indexSource.citation).toBe('Invented for a test');
  expect(content.voigtSource?.citation).toBe('Also invented');
  expect(content.voigt?.kind).toBe('table');
  expect(grower.complaints.filter((text) => !text.includes('422'))).toEqual([]);
});

it('reads a file that it exported itself back to the same numbers, asking only for the name', async () => {
  const { page, context } = grower;
  const exported = await context.request.get(`/api/v1/materials/${materialId}/export.csv`);
  const file = { name: 'invented-metal.csv', mimeType: 'text/csv', buffer: await exported.body() };
  await grower.open(`/groups/${group}/materials/import`);
  await page.getByLabel('Choose a file').setInputFiles(file);
  await page.getByText('as Skewlight exported it').waitFor();
  expect(await page.getByLabel('Formula', { exact: true }).inputValue()).toBe('Im');
  await page.getByLabel('Name', { exact: true }).fill('Invented metal again');
  await page.getByRole('button', { name: 'Create material' }).click();
  await page.getByRole('heading', { level: 1, name: 'Im, Invented metal again' }).waitFor();
  const [before, after] = [
    await ask(context, `/materials/${materialId}`, materialSchema),
    await ask(context, `/materials/${page.url().split('/').at(-1)}`, materialSchema),
  ];
  expect(after.content.index).toEqual(before.content.index);
  expect(after.content.voigt).toEqual(before.content.voigt);
  expect(after.content.voigtSource).toEqual(before.content.voigtSource);
});
