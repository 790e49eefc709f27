import AxeBuilder from '@axe-core/playwright';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { makeDecisions } from './decisions.ts';
import type { Decisions } from './decisions.ts';
import { ask, demoGroupId, demoRunId, demoStack } from './demo.ts';
import { DEMO_LINK_TOKEN } from '../../server/seeders/demoData.ts';
import { runSchema } from '../../shared/run.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// Each screen as somebody meets it, on a desk and on a phone, light and dark: nothing that keeps people out.

const WIDTHS = [1280, 390] as const;

type Screen = {
  name: string;
  address: string;
  /** What stands on the page once it has loaded what it shows. */
  landmark: string | RegExp;
  /** Opened by somebody who has not signed in. */
  open?: boolean;
};

let site: Site;
let member: Visitor;
let stranger: Visitor;
let ids: { group: string; stack: string; run: string; rerun: string } & Decisions;

beforeAll(async () => {
  site = await startSite();
  member = await site.visit({ as: 'lead' });
  stranger = await site.visit();
  const { context } = member;
  const [group, stack, run] = [
    await demoGroupId(context),
    await demoStack(context, 'Pt/Co/Pt'),
    await demoRunId(context),
  ];
  const { id: rerun } = await ask(context, `/runs/${run}/rerun`, runSchema, {});
  ids = { group, stack: stack.id, run, rerun, ...(await makeDecisions(context)) };
});

afterAll(async () => site?.stop());

const screens: Screen[] = [
  { name: 'sign-in', address: '/sign-in', landmark: 'Look around first', open: true },
  { name: 'sign-up', address: '/sign-up', landmark: 'As the people of your groups', open: true },
  { name: 'forgotten password', address: '/forgot-password', landmark: 'Send the link', open: true },
  { name: 'new password', address: '/reset-password/none', landmark: 'Set the password', open: true },
  { name: 'group home', address: '/groups/:group', landmark: 'NiFe under gold, transverse' },
  { name: 'stack', address: '/stacks/:stack', landmark: /^200 points, / },
  { name: 'runs', address: '/groups/:group/runs', landmark: 'Angle sweep at 632.8 nm' },
  { name: 'run', address: '/runs/:run', landmark: 'Values at angle 30°' },
  { name: 'share', address: `/share/${DEMO_LINK_TOKEN}`, landmark: 'Values at angle 30°', open: true },
  { name: 'share that never was', address: '/share/none', landmark: 'There is no such link', open: true },
  { name: 'compared runs', address: '/groups/:group/compare?runs=:run,:rerun', landmark: 'Root mean square' },
  { name: 'one run to compare', address: '/groups/:group/compare?runs=:run', landmark: 'Two to six runs' },
  { name: 'designs', address: '/groups/:group/designs', landmark: 'Sensitivity and tolerance' },
  ...['cap', 'optimise', 'tolerance'].map((kind) => ({
    name: `new design (${kind})`,
    address: `/groups/:group/designs/new?kind=${kind}&stack=:stack`,
    landmark: 'With several, the demands hold at each',
  })),
  { name: 'cap chooser', address: '/designs/:cap', landmark: 'Candidates in order' },
  { name: 'optimisation', address: '/designs/:search', landmark: 'Path of the search' },
  { name: 'tolerance', address: '/designs/:spread', landmark: 'Spread of the readings' },
  { name: 'studies', address: '/groups/:group/studies', landmark: 'Every item of a study' },
  // Plots further down are drawn once they are scrolled to.
  { name: 'study', address: '/studies/:study', landmark: 'Candidates in order' },
  { name: 'new card', address: '/groups/:group/cards/new?stack=:stack', landmark: 'Deposition rates' },
  { name: 'card', address: '/cards/:card', landmark: 'Predicted readings' },
  { name: 'shared design', address: '/share/:capLink', landmark: 'Candidates in order', open: true },
  { name: 'shared study', address: '/share/:studyLink', landmark: 'Values at angle 30°', open: true },
  { name: 'shared card', address: '/share/:cardLink', landmark: 'Predicted readings', open: true },
  { name: 'materials', address: '/groups/:group/materials', landmark: 'Titanium nitride' },
  { name: 'import', address: '/groups/:group/materials/import', landmark: 'At most 20 MB' },
  { name: 'material', address: '/materials/fe-johnson-1974', landmark: 'Where Q comes from' },
  { name: 'people', address: '/groups/:group/people', landmark: 'guest@northgate.example' },
  { name: 'account', address: '/account', landmark: 'No tokens yet' },
  { name: 'conventions', address: '/conventions', landmark: 'Transverse contrast', open: true },
  { name: 'mails', address: '/development/mails', landmark: 'No mail yet', open: true },
  { name: 'not found', address: '/nowhere', landmark: 'There is no such page', open: true },
];

/** Serious and critical findings of axe, each with where it is; of colours alone, of all else, or of both. */
async function accessProblems(
  page: Page,
  look: 'all' | 'colours' | 'all but colours' = 'all',
): Promise<string[]> {
  // Legacy mode looks at this page alone instead of opening a blank one for frames, which there are none of.
  const axe = new AxeBuilder({ page }).setLegacyMode();
  if (look === 'colours') axe.withRules(['color-contrast']);
  if (look === 'all but colours') axe.disableRules(['color-contrast']);
  const { violations } = await axe.analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, help, nodes }) => nodes.map(({ target }) => `${id}: ${help} at ${target.join(' ')}`));
}

function widestContent(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth);
}

it('would find what keeps people out', async () => {
  await stranger.page.setContent(
    '<html lang="en"><title>Test</title><main><h1>A</h1><img src="data:,"></main></html>',
  );
  expect(await accessProblems(stranger.page)).toEqual([expect.stringMatching(/^image-alt:.* at img$/)]);
});

describe.each(screens)('the screen $name', ({ address, landmark, open }) => {
  it.each(WIDTHS)('keeps nobody out and scrolls one way only, %i px wide', async (width) => {
    const { page, complaints } = open ? stranger : member;
    await page.setViewportSize({ width, height: width < 600 ? 844 : 900 });
    await page.emulateMedia({ colorScheme: 'light' });
    const known: Record<string, string> = ids;
    await page.goto(address.replace(/:(\w+)/g, (_, name: string) => known[name] ?? name));
    await page.getByText(landmark).first().waitFor();
    // Colours do not depend on the width, and all else does not depend on the colours.
    const wide = width >= 600;
    expect(await accessProblems(page, wide ? 'all' : 'all but colours')).toEqual([]);
    if (wide) {
      await page.emulateMedia({ colorScheme: 'dark' });
      await page.locator('html[data-theme="dark"]').waitFor();
      expect(await accessProblems(page, 'colours')).toEqual([]);
    }
    expect(await widestContent(page)).toBeLessThanOrEqual(width);
    // Chromium writes refused requests to the console; a link that never was is one.
    expect(complaints.splice(0).filter((text) => !text.includes('404'))).toEqual([]);
  });
});
