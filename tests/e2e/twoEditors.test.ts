import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Stack } from '../../shared/stack.ts';
import { stackSchema } from '../../shared/stack.ts';
import { ask, newStack } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import { thicknessOf } from './stackPage.ts';
import type { Visitor } from './visitor.ts';

let site: Site;

beforeAll(async () => {
  site = await startSite();
});

afterAll(async () => site?.stop());

const thickness = (visitor: Visitor, layer: string) => thicknessOf(visitor.page, layer);

async function thicknessesOf(visitor: Visitor, { id }: Stack): Promise<unknown[]> {
  const { document } = await ask(visitor.context, `/stacks/${id}`, stackSchema);
  return document.layers.map((layer) => ('thicknessNm' in layer ? layer.thicknessNm : null));
}

it('tells the second of two people who edit one stack, and keeps what they did', async () => {
  const first = await site.visit({ as: 'grower' });
  const second = await site.visit({ as: 'theorist' });
  const stack = await newStack(first.context, 'Edited by two');
  await first.open(`/stacks/${stack.id}`);
  await second.open(`/stacks/${stack.id}`);

  await thickness(first, 'Pt, layer 1').fill('2.5');
  await thickness(second, 'Co, layer 2').fill('0.8');
  await first.page.getByRole('button', { name: 'Save', exact: true }).click();
  await first.page.getByText(/version 2, saved just now/).waitFor();

  await second.page.getByRole('button', { name: 'Save', exact: true }).click();
  const conflict = second.page
    .getByRole('alert')
    .filter({ hasText: 'saved version 2 while you were editing' });
  await conflict.waitFor();
  expect(await conflict.innerText()).toContain('T. Halloran-Reyes');
  expect(await thickness(second, 'Co, layer 2').inputValue()).toBe('0.8');
  expect(await thicknessesOf(second, stack)).toEqual([2.5, 1, 5, 5, 100]);

  await conflict.getByRole('button', { name: 'See version 2' }).click();
  const theirs = second.page.getByRole('listitem', { name: 'Pt, layer 1' });
  await theirs.getByText('thickness of Pt, layer 1 2.5').waitFor();
  await conflict.getByRole('button', { name: 'Back to my edits' }).click();
  expect(await thickness(second, 'Co, layer 2').inputValue()).toBe('0.8');

  await conflict.getByRole('button', { name: 'Save mine on top' }).click();
  await second.page.getByText(/version 3, saved just now/).waitFor();
  expect(await thicknessesOf(second, stack)).toEqual([3, 0.8, 5, 5, 100]);
  expect(first.complaints).toEqual([]);
  // Chromium writes every refused request to the console; the conflict is the only one.
  expect(second.complaints.every((complaint) => complaint.includes('409'))).toBe(true);
});
