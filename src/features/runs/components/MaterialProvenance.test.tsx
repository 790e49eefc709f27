// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';
import type { MaterialSource } from '../../../../shared/materialSource.ts';
import type { UsedMaterial } from '../../../../shared/run.ts';
import { MaterialProvenance } from './MaterialProvenance.tsx';

afterEach(cleanup);

/** Invented: no such paper. */
const source: MaterialSource = {
  citation: 'A. Nobody, J. Inventions 1, 2 (1999)',
  doi: '10.0000/nothing',
  licence: 'CC0',
  sample: 'sputtered, 100 nm',
  temperature: '295 K',
  method: 'ellipsometry',
  confidence: 'measured',
  caution: 'The film had an oxide.',
};
const material: UsedMaterial = {
  id: 'te',
  version: 3,
  name: 'Testium',
  formula: 'Te',
  class: 'magnet',
  indexSource: source,
  voigtSource: {
    ...source,
    citation: 'Nobody',
    doi: null,
    sample: null,
    temperature: null,
    caution: null,
    confidence: 'from memory',
  },
  rangeNm: [400, 800],
  voigtRangeNm: [632.8, 632.8],
  assumedConstant: true,
  origin: ['N was conjugated: the source uses exp(+iωt).', 'Line 7: k falls by half within 2 nm.'],
};

it('shows every field of each source, and nothing for what it does not say', () => {
  render(<MaterialProvenance material={material} />);
  const index = within(screen.getByRole('region', { name: 'n, k' }));
  for (const text of [
    source.sample!,
    source.temperature!,
    source.method!,
    source.licence!,
    source.caution!,
  ]) {
    expect(index.getByText(text)).toBeTruthy();
  }
  expect(index.getByText('measured')).toBeTruthy();
  expect(index.getByRole('link', { name: 'doi:10.0000/nothing' }).getAttribute('href')).toBe(
    'https://doi.org/10.0000/nothing',
  );
  const voigt = within(screen.getByRole('region', { name: 'Q' }));
  expect(voigt.getByText('from memory')).toBeTruthy();
  expect(voigt.queryByRole('link')).toBeNull();
  expect(voigt.queryByText('Sample')).toBeNull();
});

it('tells how an imported table was read, warnings too', () => {
  render(<MaterialProvenance material={material} />);
  expect(screen.getByText('N was conjugated: the source uses exp(+iωt).')).toBeTruthy();
  expect(screen.getByText('Line 7: k falls by half within 2 nm.')).toBeTruthy();
  cleanup();
  const { origin: _origin, ...typed } = material;
  render(<MaterialProvenance material={typed} />);
  expect(screen.queryByText(/imported table/)).toBeNull();
});
