// @vitest-environment jsdom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, expect, it } from 'vitest';
import type { StudyItem } from '../../../../shared/study.ts';
import { rowsOf } from '../model/rows.ts';
import type { StudyRow } from '../model/rows.ts';
import { StudyItemList } from './StudyItemList.tsx';

afterEach(cleanup);

const items: StudyItem[] = ['first', 'second', 'third'].map((text) => ({ kind: 'note', id: text, text }));

function Editable() {
  const [rows, setRows] = useState<readonly StudyRow[]>(rowsOf(items));
  return (
    <StudyItemList
      rows={rows}
      onRows={(change) => setRows(change)}
      renderPinned={() => null}
      nameOf={(item) => item.id}
    />
  );
}

/** As screen readers name the items: `1. first`. */
const order = () =>
  screen.getAllByRole('region').map((region) => region.getAttribute('aria-label')?.replace(/^\d+\. /, ''));

it('moves by keyboard and keeps the focus on the control that moved', async () => {
  const user = userEvent.setup();
  render(<Editable />);
  screen.getByRole('button', { name: 'Move third up' }).focus();
  await user.keyboard('{Enter}');
  expect(order()).toEqual(['first', 'third', 'second']);
  const up = screen.getByRole('button', { name: 'Move third up' });
  await waitFor(() => expect(document.activeElement).toBe(up));
  expect(screen.getByRole('status').textContent).toBe('third is now number 2 of 3.');
});

it('gives the focus to the other button at the end of the list', async () => {
  const user = userEvent.setup();
  render(<Editable />);
  await user.click(screen.getByRole('button', { name: 'Move second up' }));
  const down = screen.getByRole('button', { name: 'Move second down' });
  await waitFor(() => expect(document.activeElement).toBe(down));
  expect(order()).toEqual(['second', 'first', 'third']);
});

it('keeps a removed item in its place until it is put back', async () => {
  const user = userEvent.setup();
  render(<Editable />);
  await user.click(screen.getByRole('button', { name: 'Remove second' }));
  expect(order()).toEqual(['first', 'third']);
  expect(screen.getByText('second is removed when you save.')).toBeTruthy();
  await user.click(screen.getByRole('button', { name: 'Put it back: second' }));
  expect(order()).toEqual(['first', 'second', 'third']);
});

it('offers no change to a reader', () => {
  render(
    <StudyItemList
      rows={rowsOf(items)}
      onRows={undefined}
      renderPinned={() => null}
      nameOf={(item) => item.id}
    />,
  );
  expect(screen.queryAllByRole('button')).toEqual([]);
  expect(screen.getByText('second')).toBeTruthy();
});
