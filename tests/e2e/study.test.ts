import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoGroupId, demoRunId } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

let site: Site;
let lead: Visitor;
let groupId: string;
let runId: string;

beforeAll(async () => {
  site = await startSite();
  lead = await site.visit({ as: 'lead' });
  groupId = await demoGroupId(lead.context);
  runId = await demoRunId(lead.context);
});

afterAll(async () => site?.stop());

describe('a study', () => {
  let link = '';

  it('begins with a question, takes a note and a pinned plot, is ordered by keyboard and decided', async () => {
    const { page } = lead;
    await lead.open(`/groups/${groupId}/studies`);
    await page.getByRole('button', { name: 'New study' }).click();
    await page.getByLabel('Title').fill('Angle for the bench');
    await page.getByLabel('Question').fill('At which angle do we read the film?');
    await page.getByRole('button', { name: 'Create study' }).click();
    await page.getByRole('heading', { level: 1, name: 'Angle for the bench' }).waitFor();
    const address = new URL(page.url()).pathname;

    await lead.open(`/runs/${runId}?unit=deg&at=30`);
    await page.getByRole('button', { name: 'Pin to a study' }).click();
    await page.getByLabel('Study', { exact: true }).selectOption({ label: 'Angle for the bench' });
    await page.getByLabel('Caption').fill('Rotation against angle');
    await page.getByRole('button', { name: 'Pin', exact: true }).click();
    await page.getByText('stands at the end of').waitFor();

    await lead.open(address);
    await page.getByText('Values at angle 30°').waitFor();
    expect(await page.getByLabel('Unit of the angles').inputValue()).toBe('deg');

    await page.getByRole('button', { name: 'Add note' }).click();
    await page.getByLabel('Note', { exact: true }).fill('**Read** this <script>window.hurt = true</script>');
    const up = page.getByRole('button', { name: /^Move note .* up$/ });
    await up.focus();
    await page.keyboard.press('Enter');
    await page.getByRole('region', { name: /^1\. note/ }).waitFor();
    const down = page.getByRole('button', { name: /^Move note .* down$/ });
    await expect.poll(() => down.evaluate((button) => button === document.activeElement)).toBe(true);

    await page.getByLabel('What was decided, and why').fill('Read at **45°**.');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved', { exact: true }).waitFor();
    await page.getByText(/^Decided by /).waitFor();
    await page.getByText(/^Version 3, /).waitFor();
  });

  it('is opened from its link by somebody without an account, with live plots and sources', async () => {
    const { page } = lead;
    await page.getByRole('button', { name: 'Make a link' }).click();
    link = await page.getByLabel('Address of the new link').inputValue();
    const reader = await site.visit({ width: 390, height: 844 });
    await reader.open(new URL(link).pathname);
    const shared = reader.page;
    await shared.getByRole('heading', { level: 1, name: 'Angle for the bench' }).waitFor();
    expect(await shared.locator('strong', { hasText: 'Read' }).count()).toBe(1);
    expect(await shared.evaluate('window.hurt')).toBeUndefined();
    await shared.getByText('Values at angle 30°').waitFor();
    await shared.getByText('Assumptions, sources and files').first().click();
    await shared.getByRole('heading', { name: 'Sources of the constants' }).waitFor();
    expect(await shared.getByText('45°', { exact: true }).count()).toBe(1);
    const width = await shared.evaluate('document.documentElement.scrollWidth');
    expect(width).toBeLessThanOrEqual(390);
    expect(reader.complaints).toEqual([]);
  });

  it('compares two runs from the list, in words, curves and numbers', async () => {
    const { page } = lead;
    await lead.open(`/groups/${groupId}/runs`);
    const boxes = page.getByRole('checkbox', { name: /^Compare / });
    await boxes.first().waitFor();
    await boxes.first().check();
    expect(await page.getByText('(1 of 6 ticked)').count()).toBe(1);
    await page.getByRole('link', { name: /^Compare/ }).click();
    await page.getByText('Two to six runs make a comparison').waitFor();
    const made = await lead.context.request.post(`/api/v1/runs/${runId}/rerun`);
    expect(made.ok()).toBe(true);
    const rerun: unknown = await made.json();
    const id = typeof rerun === 'object' && rerun !== null && 'id' in rerun ? String(rerun.id) : '';
    await lead.open(`/runs/${id}`);
    await page.getByRole('button', { name: 'Pin to a study' }).waitFor();
    await lead.open(`/groups/${groupId}/compare?runs=${runId},${id}`);
    await page.getByText('The inputs of these runs are the same', { exact: false }).waitFor();
    const numbers = page.getByRole('region', { name: 'Differences in numbers' });
    expect(await numbers.getByRole('rowheader').count()).toBe(1);
    expect(lead.complaints).toEqual([]);
  });
});
