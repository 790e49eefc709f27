import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { readFile } from 'node:fs/promises';
import { solveResponseSchema } from '../../shared/solve.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { projectRoot } from '../../server/projectRoot.ts';
import { ask, demoStack } from './demo.ts';
import { endAtFirstFailure } from './endAtFirstFailure.ts';
import { eventually } from './eventually.ts';
import { asPrinted, isDrawn, stripReading, tableReading } from './readings.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { keepAsRun, sweepDrawn, sweepFields, thicknessOf } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

// From the sign-in to a link that no longer opens: each part goes on where the one before ended.

const COBALT_NM = 1.4;
const ANGLE_DEG = 30;

endAtFirstFailure();
let site: Site;
let lead: Visitor;
let reader: Visitor;
let film: StackDocument;
let rotationDeg: number;
let shareUrl: string;

beforeAll(async () => {
  site = await startSite();
  lead = await site.visit();
  reader = await site.visit();
});

afterAll(async () => site?.stop());

it('signs in and opens a stack of the group', async () => {
  const { page } = lead;
  await lead.open('/');
  await page.getByLabel('E-mail').fill('lead@northgate.example');
  await page.getByLabel('Password').fill('northgate-demo');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('heading', { level: 1, name: 'Northgate Films' }).waitFor();
  const stacks = page.getByRole('region', { name: 'Stacks' });
  await stacks.getByRole('link', { name: 'Pt/Co/Pt on oxidised silicon', exact: true }).click();
  await thicknessOf(page, 'Co, layer 2').waitFor();
});

it('shows new readings when a thickness is changed on the drawing', async () => {
  const { page, context } = lead;
  await eventually(() => stripReading(page, 'Kerr rotation')).not.toBeNaN();
  const before = await stripReading(page, 'Kerr rotation');
  await thicknessOf(page, 'Co, layer 2').fill(String(COBALT_NM));

  const { document } = await demoStack(context, 'Pt/Co/Pt');
  film = {
    ...document,
    layers: document.layers.map((layer) =>
      layer.id === 'film' ? { ...layer, thicknessNm: COBALT_NM } : layer,
    ),
  };
  expect(film.workingPoint.angleDeg).toBe(ANGLE_DEG);
  // The film without its m is isotropic and turns nothing, so the change is the angle itself.
  const request = { cases: [toSolveCase(film, film.workingPoint.wavelengthNm, ANGLE_DEG)] };
  const { results } = await ask(context, '/solve', solveResponseSchema, request);
  rotationDeg = results[0]?.points[0]?.kerr.p?.rotationDeg ?? NaN;

  await eventually(() => stripReading(page, 'Kerr rotation')).toBe(asPrinted(rotationDeg * 1000));
  expect(asPrinted(rotationDeg * 1000)).not.toBe(before);
});

it('sweeps the angle and keeps the sweep as a run', async () => {
  const { page } = lead;
  await page.getByRole('tab', { name: 'angle' }).click();
  await sweepFields(page, 'angle').to.fill('80');
  await sweepFields(page, 'angle').points.fill('161');
  await sweepDrawn(page, 161);
  expect(await isDrawn(page)).toBe(true);
  await keepAsRun(page);
  await page.getByText(`Values at angle ${ANGLE_DEG}°`).waitFor();
  expect(await tableReading(page, 'Kerr rotation')).toBe(asPrinted(rotationDeg * 1000));
  await eventually(() => isDrawn(page)).toBe(true);
});

it('makes a share link', async () => {
  const { page } = lead;
  await page.getByLabel('For whom (only you see it)').fill('Reading group');
  await page.getByRole('button', { name: 'Make a link' }).click();
  const address = page.getByLabel('Address of the new link');
  await address.waitFor();
  shareUrl = await address.inputValue();
  expect(shareUrl.startsWith(`${site.url}/share/`)).toBe(true);
});

it('opens the link in a browser that knows nobody, with all that the numbers rest on', async () => {
  const { page, context } = reader;
  expect(await context.cookies()).toEqual([]);
  await reader.open(shareUrl);
  await page.getByText(`Values at angle ${ANGLE_DEG}°`).waitFor();
  expect(await tableReading(page, 'Kerr rotation')).toBe(asPrinted(rotationDeg * 1000));
  await eventually(() => isDrawn(page)).toBe(true);

  const drawing = page.getByRole('region', { name: 'Film' });
  expect(await drawing.getByRole('listitem', { name: 'Co, layer 2' }).innerText()).toContain(`${COBALT_NM}`);
  expect(await drawing.getByRole('spinbutton').count()).toBe(0);
  const assumptions = page.getByRole('region', { name: 'Assumptions' });
  expect(await assumptions.innerText()).toContain('Vacuum wavelength 632.8 nm.');
  const sources = page.getByRole('region', { name: 'Sources of the constants' });
  expect(await sources.getByRole('link', { name: '10.1103/PhysRevB.9.5056' }).count()).toBe(1);
  expect(await page.getByText('Northgate').count()).toBe(0);
  expect(await context.cookies()).toEqual([]);
});

it('reads a value at another angle with the keyboard', async () => {
  const { page } = reader;
  const figure = page.getByRole('slider', { name: /read values along/ });
  await figure.press('Home');
  await page.getByText('Values at angle 0°').waitFor();
  expect(await figure.getAttribute('aria-valuetext')).toMatch(/^0.*rotation/);
});

it('gives the values and an input that the command line solves to the same number', async () => {
  const csv = (await readFile(await download('Values (CSV)'), 'utf8')).split('\n').filter(isValueLine);
  const table = csv.map((line) => line.split(','));
  const rotation = table[0]?.findIndex((title) => title.startsWith('"Kerr rotation')) ?? -1;
  const row = table.findIndex(([angle]) => Number(angle) === ANGLE_DEG);
  expect(table).toHaveLength(1 + 161);
  expect(Number(table[row]?.[rotation])).toBeCloseTo(rotationDeg, 12);

  const solved = await solveOnCommandLine(await download('Input (input.json)'));
  const points = solved.results.flatMap((result) => result.points);
  expect(points).toHaveLength(161);
  const point = points.find(({ angleDeg }) => angleDeg === ANGLE_DEG);
  expect(point?.kerr.p?.rotationDeg).toBeCloseTo(rotationDeg, 12);
});

it('refuses the link once it is revoked', async () => {
  const row = lead.page.getByRole('listitem').filter({ hasText: 'Reading group' });
  await row.getByRole('button', { name: 'Revoke' }).click();
  await lead.page.getByRole('button', { name: 'Revoke link' }).click();
  await row.getByText(/^revoked/).waitFor();
  expect([...lead.complaints, ...reader.complaints]).toEqual([]);

  await reader.page.reload();
  await reader.page.getByRole('heading', { level: 1, name: 'This link no longer opens' }).waitFor();
  const token = shareUrl.split('/').at(-1);
  for (const part of ['', '/data', '/data.csv', '/input.json']) {
    expect((await reader.context.request.get(`/api/v1/shared/${token}${part}`)).status()).toBe(410);
  }
});

/** Lines of a CSV file without its comments. */
const isValueLine = (line: string) => line.trim() !== '' && !line.startsWith('#');

async function download(link: string): Promise<string> {
  const [file] = await Promise.all([
    reader.page.waitForEvent('download'),
    reader.page.getByRole('link', { name: link }).click(),
  ]);
  return file.path();
}

async function solveOnCommandLine(file: string) {
  const program = ['--import', 'tsx', 'worker/solve.ts', file];
  const { stdout } = await promisify(execFile)(process.execPath, program, {
    cwd: projectRoot,
    maxBuffer: 64 * 1024 * 1024,
  });
  return solveResponseSchema.parse(JSON.parse(stdout));
}
