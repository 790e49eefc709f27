import type { Page } from 'playwright-core';

/** A number as the screen prints it: a real minus sign, a sign for angles, its unit behind it. */
export function printedNumber(text: string): number {
  const number = /[+−-]?\d+(\.\d+)?/.exec(text)?.[0];
  return number === undefined ? NaN : Number(number.replace('−', '-'));
}

/** What the screen makes of a number: four significant digits. */
export const asPrinted = (value: number): number => Number(value.toPrecision(4));

/** A reading of the strip, by its label; NaN while the film is being solved. */
export async function stripReading(page: Page, label: string): Promise<number> {
  const strip = page.getByRole('region', { name: 'Readings at the working point' });
  if ((await strip.locator('[aria-busy="true"]').count()) > 0) return NaN;
  const lines = (await strip.innerText()).split('\n').filter((line) => line.trim() !== '');
  const place = lines.findIndex((line) => line.trim() === label);
  return place < 0 ? NaN : printedNumber(lines[place + 1] ?? '');
}

/** A value of the table beside a stored run, for p light, by the name of its row. */
export async function tableReading(page: Page, label: string): Promise<number> {
  const table = page.getByRole('region', { name: 'Readings', exact: true });
  const row = table.getByRole('row', { name: label });
  return printedNumber(await row.getByRole('cell').first().innerText());
}

/** Whether anything but one colour is on the canvas of the figure. */
export function isDrawn(page: Page): Promise<boolean> {
  return page
    .locator('figure canvas')
    .first()
    .evaluate((canvas) => {
      if (!(canvas instanceof HTMLCanvasElement)) return false;
      const pixels = canvas.getContext('2d')?.getImageData(0, 0, canvas.width, canvas.height).data;
      return new Set(new Uint32Array(pixels?.buffer ?? new ArrayBuffer(0))).size > 10;
    });
}

/** Waits for the shipped font, and for the figure that is drawn anew with it. */
export function fontsShown(page: Page): Promise<void> {
  return page.evaluate(async () => {
    await document.fonts.ready;
    await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
  });
}
