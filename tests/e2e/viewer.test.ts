import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { sessionSchema } from '../../shared/account.ts';
import type { Stack } from '../../shared/stack.ts';
import { ask, demoRunId, demoStack } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { workingPoint } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

/** Names of controls that change what belongs to the group; a viewer meets none of them, an owner several a page. */
const CHANGES =
  /^(New stack|Save$|Undo|Redo|Keep as run|Move |Actions for|Delete|Rerun|Run it again|Make a link|Revoke|Add$|Remove|Cancel)/;

let site: Site;
let owner: Visitor;
let viewer: Visitor;
let stack: Stack;
let runId: string;

beforeAll(async () => {
  site = await startSite();
  owner = await site.visit({ as: 'lead' });
  viewer = await site.visit({ as: 'guest' });
  stack = await demoStack(viewer.context, 'Pt/Co/Pt');
  runId = await demoRunId(viewer.context);
});

afterAll(async () => site?.stop());

async function changeControls(page: Page): Promise<string[]> {
  const buttons = await page.getByRole('button').all();
  const names = await Promise.all(
    buttons.map(async (button) => (await button.getAttribute('aria-label')) ?? (await button.innerText())),
  );
  const fields = await page.getByRole('spinbutton', { name: /^thickness of/ }).count();
  return [...names.filter((name) => CHANGES.test(name)), ...(fields > 0 ? ['thickness'] : [])];
}

describe('somebody who may look and not change', () => {
  const pages = () => [
    { name: 'home', address: `/groups/${stack.groupId}`, landmark: 'Pt/Co/Pt on oxidised silicon' },
    { name: 'stack', address: `/stacks/${stack.id}`, landmark: 'thermal oxide' },
    { name: 'run', address: `/runs/${runId}`, landmark: 'Values at angle 30°' },
    { name: 'runs', address: `/groups/${stack.groupId}/runs`, landmark: 'Angle sweep at 632.8 nm' },
    { name: 'people', address: `/groups/${stack.groupId}/people`, landmark: 'guest@northgate.example' },
  ];

  it('meets no control that changes anything, where an owner meets some on each page', async () => {
    for (const { name, address, landmark } of pages()) {
      for (const visitor of [owner, viewer]) {
        await visitor.open(address);
        const { page } = visitor;
        const text = page.getByText(landmark).or(page.locator(`input[value="${landmark}"]`));
        await text.first().waitFor();
      }
      expect(await changeControls(owner.page), name).not.toEqual([]);
      expect(await changeControls(viewer.page), name).toEqual([]);
    }
    expect(viewer.complaints).toEqual([]);
  });

  it('still reads the film at a working point of their own', async () => {
    await viewer.open(`/stacks/${stack.id}`);
    await viewer.page.getByText('You may look, not change.').waitFor();
    await workingPoint(viewer.page).angle.fill('45');
    await viewer.page.waitForURL(/angle=45/);
  });

  it('is refused by the server, whatever the screen shows', async () => {
    const { request } = viewer.context;
    const { groupId, document, version } = stack;
    const axis = { kind: 'angle', from: 0, to: 80, points: 3, spacing: 'linear' };
    const { user } = await ask(viewer.context, '/session', sessionSchema);
    const attempts = [
      ['POST', `/groups/${groupId}/stacks`, { name: 'Mine', document }],
      ['PATCH', `/stacks/${stack.id}`, { version, name: 'Renamed' }],
      ['DELETE', `/stacks/${stack.id}`, undefined],
      ['POST', '/runs', { groupId, document, axis }],
      ['DELETE', `/runs/${runId}`, undefined],
      ['POST', `/runs/${runId}/cancel`, undefined],
      ['POST', `/runs/${runId}/rerun`, undefined],
      ['GET', `/runs/${runId}/links`, undefined],
      ['POST', `/runs/${runId}/links`, { label: '', expiresAt: null }],
      ['GET', `/groups/${groupId}/links`, undefined],
      ['POST', `/groups/${groupId}/members`, { email: 'new@northgate.example', role: 'owner' }],
      ['PATCH', `/groups/${groupId}/members/${user.id}`, { role: 'owner' }],
    ] as const;
    for (const [method, path, data] of attempts) {
      const answer = await request.fetch(`/api/v1${path}`, { method, ...(data ? { data } : {}) });
      expect(`${method} ${path} ${answer.status()}`).toBe(`${method} ${path} 403`);
    }
    expect((await demoStack(viewer.context, 'Pt/Co/Pt')).version).toBe(version);
  });
});
