// @vitest-environment jsdom
// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it } from 'vitest';
import { DataTable } from './DataTable.tsx';
import type { Column } from './DataTable.tsx';

afterEach(cleanup);

type Film = { id: string; name: string; layers: number; used: string | null };

const films: Film[] = [
  { id: 'a', name: 'film 10', layers: 5, used: null },
  { id: 'b', name: 'film 9', layers: 42, used: '2026-03-01' },
  { id: 'c', name: 'Film 1', layers: 4, used: '2026-01-01' },
];

const columns: Column<Film>[] = [
  { id: 'name', header: 'Film', value: (film) => film.name },
  { id: 'layers', header: 'Layers', value: (film) => film.layers, align: 'end' },
  { id: 'used', header: 'Used', value: (film) => film.used },
  {
    id: 'actions',
    header: 'Actions',
    hideHeader: true,
    sortable: false,
    value: () => null,
    cell: (film) => <button type="button">Delete {film.name}</button>,
  },
];

function setUp(rows: readonly Film[] = films) {
  render(
    <DataTable
      caption="Films"
      columns={columns}
      rows={rows}
      rowKey={(film) => film.id}
      empty={<p>No films yet</p>}
      initialSort={{ id: 'layers', descending: false }}
    />,
  );
  return userEvent.setup();
}

const names = () => screen.getAllByRole('rowheader').map((cell) => cell.textContent);
const header = (name: string) => screen.getByRole('columnheader', { name });

describe('DataTable', () => {
  it('starts in the order asked for and says so', () => {
    setUp();
    expect(names()).toEqual(['Film 1', 'film 10', 'film 9']);
    expect(header('Layers').getAttribute('aria-sort')).toBe('ascending');
    expect(header('Film').hasAttribute('aria-sort')).toBe(false);
  });

  it('sorts by keyboard: texts as people count, and back', async () => {
    const user = setUp();
    within(header('Film')).getByRole('button').focus();
    await user.keyboard('{Enter}');
    expect(names()).toEqual(['Film 1', 'film 9', 'film 10']);
    expect(header('Film').getAttribute('aria-sort')).toBe('ascending');
    await user.keyboard('{Enter}');
    expect(names()).toEqual(['film 10', 'film 9', 'Film 1']);
  });

  it('keeps rows without a value last in both directions, shown as a dash', async () => {
    const user = setUp();
    const used = within(header('Used')).getByRole('button');
    await user.click(used);
    expect(names().at(-1)).toBe('film 10');
    await user.click(used);
    expect(names().at(-1)).toBe('film 10');
    expect(names()[0]).not.toBe(names()[1]);
    const last = screen.getAllByRole('row').at(-1);
    expect(last && within(last).getAllByRole('cell')[1]?.textContent).toContain('–');
  });

  it('does not offer to sort by actions', () => {
    setUp();
    expect(within(header('Actions')).queryByRole('button')).toBeNull();
    expect(screen.getAllByRole('button', { name: /^Delete/ })).toHaveLength(3);
  });

  it('shows what it was given for no rows', () => {
    setUp([]);
    expect(screen.getByText('No films yet')).toBeTruthy();
    expect(screen.queryByRole('table')).toBeNull();
  });
});
