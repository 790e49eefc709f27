import type { Locator, Page } from 'playwright-core';

/** What the stack page calls its parts, said once for all tests. */
type Swept = 'wavelength' | 'angle' | 'thickness';

const unitOf = { wavelength: 'nm', angle: '°', thickness: 'nm' } as const;

/** The thickness on the drawing, by what the layer is called there, such as "Co, layer 2". */
export function thicknessOf(page: Page, layer: string): Locator {
  return page.getByLabel(`thickness of ${layer} (nm)`, { exact: true });
}

/** Light and angle of the readings strip. */
export function workingPoint(page: Page) {
  const bar = page.getByRole('group', { name: 'Working point' });
  return {
    wavelength: bar.getByLabel('wavelength (nm)', { exact: true }),
    angle: bar.getByLabel('angle of incidence (°)', { exact: true }),
    sLight: bar.getByRole('button', { name: 's light' }),
  };
}

/** From, to and the points of the sweep on the page. */
export function sweepFields(page: Page, swept: Swept) {
  const field = (label: string) => page.getByLabel(label, { exact: true });
  return {
    from: field(`${swept} from (${unitOf[swept]})`),
    to: field(`${swept} to (${unitOf[swept]})`),
    points: field(`points of the run along ${swept} (points)`),
  };
}

/** Waits until the curve on the page has as many points, or is a preview of more. */
export async function sweepDrawn(page: Page, points: number | 'preview'): Promise<void> {
  await page
    .getByText(points === 'preview' ? /^preview of \d+ points, / : `${points} points, `)
    .first()
    .waitFor();
}

/** Keeps the sweep on the page and waits for the page of its run. */
export async function keepAsRun(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Keep as run' }).click();
  await page.waitForURL(/\/runs\/[^/]+$/);
}
