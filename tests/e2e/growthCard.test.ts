import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import QRCode from 'qrcode';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { designListSchema } from '../../shared/design.ts';
import { growthCardSchema } from '../../shared/growthCard.ts';
import { ask, demoGroupId } from './demo.ts';
import { endAtFirstFailure } from './endAtFirstFailure.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// From the answer of the demo study to the paper in the chamber: each part goes on where the one before ended.

endAtFirstFailure();
const execute = promisify(execFile);
let site: Site;
let grower: Visitor;
let folder: string;
let pdf: string;

beforeAll(async () => {
  site = await startSite();
  grower = await site.visit({ as: 'grower' });
  folder = await mkdtemp(path.join(tmpdir(), 'skewlight-card-'));
  pdf = path.join(folder, 'card.pdf');
});

afterAll(async () => {
  await site?.stop();
  await rm(folder, { recursive: true, force: true });
});

it('is made from the answer that the demo study rests on', async () => {
  const { page, context } = grower;
  const { designs } = await ask(context, `/groups/${await demoGroupId(context)}/designs`, designListSchema);
  const design = designs.find(({ isDemo }) => isDemo);
  await grower.open(`/designs/${design?.id}`);
  await page.getByRole('link', { name: 'Growth card' }).first().click();
  await page.getByLabel('Title').fill('Gold for the e2e chamber');
  await page.getByLabel('Sample id').fill('E2E-7');
  await page.getByLabel('Bench').fill('HeNe laser, analyzer 1.5° off crossing');
  await page.getByLabel('Decision').fill('Gold: it leaves 65.9 mdeg.');
  await page.getByRole('checkbox', { name: /^Print a QR code/ }).check();
  await page.getByRole('button', { name: 'Make the card' }).click();
  await page.getByRole('article', { name: 'Growth card Gold for the e2e chamber' }).waitFor();
});

it('says on one page of PDF every number and sentence that the screen shows', async () => {
  const { page } = grower;
  const downloading = page.waitForEvent('download');
  await page.getByRole('link', { name: 'PDF' }).click();
  await (await downloading).saveAs(pdf);
  const { stdout: facts } = await execute('pdfinfo', [pdf]);
  expect(facts).toMatch(/^Pages:\s+1$/m);
  expect(facts).toMatch(/^Page size:.*\(A4\)$/m);
  // In the order in which it was drawn: cell by cell, also where a cell has two lines.
  const { stdout: text } = await execute('pdftotext', ['-raw', pdf, '-']);
  const shown = await page.getByRole('article').innerText();
  const numbers = numbersOf(shown);
  expect(numbers.size).toBeGreaterThan(40);
  const printed = numbersOf(text);
  const missing = [...numbers].filter(([number, times]) => (printed.get(number) ?? 0) < times);
  expect(missing).toEqual([]);
  const sentences = await page
    .getByRole('article')
    .locator('li, caption > *, td, section p, footer p')
    .allInnerTexts();
  const said = sentences.map((one) => one.trim()).filter((one) => one !== '' && one !== 'to fill in');
  expect(said.length).toBeGreaterThan(40);
  expect(said.filter((one) => !squeeze(text).includes(squeeze(one)))).toEqual([]);
});

it('prints the same page from the browser', async () => {
  const file = path.join(folder, 'print.pdf');
  await grower.page.pdf({ path: file, format: 'A4' });
  const { stdout: facts } = await execute('pdfinfo', [file]);
  expect(facts).toMatch(/^Pages:\s+1$/m);
  const { stdout: text } = await execute('pdftotext', ['-raw', file, '-']);
  const card = await storedCard();
  for (const said of [card.title, card.sampleId, card.inputSha256, card.url!]) {
    expect(squeeze(text)).toContain(squeeze(said));
  }
});

it('carries a code that opens what it rests on without an account', async () => {
  const { url } = await storedCard();
  expect(await grower.page.getByRole('img', { name: `QR code of ${url}` }).count()).toBe(1);
  const { size, data } = QRCode.create(url!, { errorCorrectionLevel: 'M' }).modules;
  expect(await printedCode(size)).toEqual([...data].map(Boolean));
  const reader = await site.visit({ width: 390, height: 844 });
  await reader.open(new URL(url!).pathname);
  await reader.page.getByRole('heading', { name: 'Candidates in order' }).waitFor();
  expect(reader.complaints).toEqual([]);
  expect(grower.complaints).toEqual([]);
});

async function storedCard() {
  const { page, context } = grower;
  return ask(context, `/cards/${new URL(page.url()).pathname.split('/').at(-1)}`, growthCardSchema);
}

/** How often each number stands in the text. Addresses and hashes have digits too, which are looked for whole. */
function numbersOf(text: string): Map<string, number> {
  const words = text.split(/\s+/).filter((word) => !/^https?:|^[0-9a-f]{32,}$|^[\w-]{40,}$/.test(word));
  const counts = new Map<string, number>();
  for (const [number] of words.join(' ').matchAll(/[+−]?\d+(?:\.\d+)?/g)) {
    counts.set(number, (counts.get(number) ?? 0) + 1);
  }
  return counts;
}

/** Lines are broken where they are full; the font of the PDF has no ≥. */
const squeeze = (text: string) => text.replace(/\s+/g, '').replaceAll('≥', '>=');

/** The modules of the code as they stand on the paper, row by row: it is all there is in the upper right corner. */
async function printedCode(size: number): Promise<boolean[]> {
  const root = path.join(folder, 'picture');
  await execute('pdftoppm', ['-r', '300', '-gray', '-singlefile', pdf, root]);
  const { width, pixels } = readGrayMap(await readFile(`${root}.pgm`));
  const isDark = (x: number, y: number) => pixels[y * width + x]! < 128;
  let [left, right, top] = [width, 0, Infinity];
  for (let y = 0; y < 0.12 * width; y += 1) {
    for (let x = Math.ceil(0.8 * width); x < width; x += 1) {
      if (!isDark(x, y)) continue;
      [left, right, top] = [Math.min(left, x), Math.max(right, x + 1), Math.min(top, y)];
    }
  }
  const step = (right - left) / size;
  return Array.from({ length: size * size }, (_, at) =>
    isDark(
      Math.floor(left + ((at % size) + 0.5) * step),
      Math.floor(top + (Math.floor(at / size) + 0.5) * step),
    ),
  );
}

/** A picture as pdftoppm writes it: `P5 width height 255`, then a byte for each pixel. */
function readGrayMap(bytes: Buffer): { width: number; pixels: Buffer } {
  const head = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(bytes.subarray(0, 40).toString('latin1'));
  if (!head) throw new Error('pdftoppm wrote something else than a gray map.');
  return { width: Number(head[1]), pixels: bytes.subarray(head[0].length) };
}
