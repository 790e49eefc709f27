// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter, useLocation } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import { useMaterialFilter } from '../hooks/useMaterialFilter.ts';
import { buildSummary } from '../materialFixtures.ts';
import { filterMaterials } from '../model/materialFilter.ts';
import { MaterialFilterBar } from './MaterialFilterBar.tsx';

afterEach(cleanup);

const library = [
  buildSummary('Co', { class: 'magnet', rangeNm: [400, 900], voigtRangeNm: [632.8, 632.8] }),
  buildSummary('Fe', { class: 'magnet', rangeNm: [300, 1900], groupId: 'g' }),
  buildSummary('Pt', { class: 'noble' }),
];

function Harness() {
  const [filter, change] = useMaterialFilter();
  const found = filterMaterials(library, filter);
  return (
    <>
      <MaterialFilterBar filter={filter} onChange={change} found={found.length} total={library.length} />
      <p aria-label="found">{found.map(({ id }) => id).join(' ')}</p>
      <p aria-label="address">{useLocation().search}</p>
      <button type="button" onClick={() => change(null)}>
        Show all
      </button>
    </>
  );
}

function show(address = '/') {
  render(
    <MemoryRouter initialEntries={[address]}>
      <Harness />
    </MemoryRouter>,
  );
  const text = (name: string) => screen.getByLabelText(name).textContent;
  return { found: () => text('found'), address: () => text('address') };
}

describe('MaterialFilterBar', () => {
  it('narrows the list, keeps the filter in the address and lets go of it', async () => {
    const user = userEvent.setup();
    const page = show();
    await user.selectOptions(screen.getByLabelText('Class'), 'magnet');
    expect(page.found()).toBe('Co Fe');
    await user.type(screen.getByLabelText('Covers from, nm'), '350');
    expect(page.found()).toBe('Fe');
    expect(page.address()).toBe('?class=magnet&from=350');
    expect(screen.getByRole('status').textContent).toBe('1 of 3 materials');
    await user.click(screen.getByRole('button', { name: 'Show all' }));
    expect(page.found()).toBe('Co Fe Pt');
    expect(screen.getByLabelText<HTMLInputElement>('Covers from, nm').value).toBe('');
  });

  it('opens as the address says', () => {
    const page = show('/?in=group&voigt=unknown');
    expect(page.found()).toBe('Fe');
    expect(screen.getByLabelText<HTMLSelectElement>('Where').value).toBe('group');
  });

  it('marks what is no wavelength and does not ask for it', async () => {
    const user = userEvent.setup();
    const page = show();
    await user.type(screen.getByLabelText('Covers to, nm'), 'red');
    expect(screen.getByLabelText('Covers to, nm').getAttribute('aria-invalid')).toBe('true');
    expect(page.address()).toBe('');
  });
});
