// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, expect, it } from 'vitest';
import { ValueTable } from './ValueTable.tsx';

afterEach(cleanup);

it('lists every stored reading for both lights, in the unit of the screen, with a link to its definition', () => {
  render(
    <MemoryRouter>
      <ValueTable
        place="angle 60°"
        values={{
          rotationP: 0.04029,
          rotationS: NaN,
          crossSp: 5.61e-4,
          contrastP: 2e-16,
          reflectanceS: 0.623,
        }}
        unit="mdeg"
      />
    </MemoryRouter>,
  );
  const cells = (name: string) =>
    within(screen.getByRole('row', { name: new RegExp(name) }))
      .getAllByRole('cell')
      .map(({ textContent }) => textContent);
  expect(cells('Kerr rotation')).toEqual(['+40.29 mdeg', '–']);
  expect(cells('Reflectance')).toEqual(['', '0.6230']);
  expect(cells('Cross-polarized')).toEqual(['0.5610 × 10⁻³', '']);
  // 2e-16 is what two equal reflectances leave in doubles.
  expect(cells('Transverse contrast')).toEqual(['0', '']);
  expect(screen.getByRole('link', { name: 'Kerr rotation' }).getAttribute('href')).toBe(
    '/conventions#kerr-rotation',
  );
});
