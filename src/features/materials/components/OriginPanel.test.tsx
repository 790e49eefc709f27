// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { ownHabits } from '../../../../shared/materialImport.ts';
import type { ImportOrigin } from '../../../../shared/materialImport.ts';
import { OriginPanel } from './OriginPanel.tsx';

afterEach(cleanup);

const origin: ImportOrigin = {
  importId: 'i1',
  fileName: 'film.csv',
  sha256: 'ab12',
  rows: 1200,
  mapping: {
    spectral: { column: 0, unit: 'nm' },
    index: { from: 'n, k', n: 1, k: 2 },
    voigt: null,
    indexOf: null,
    habits: ownHabits,
  },
  sentences: ['k changed its sign.'],
  warnings: [{ code: 'jump', message: 'n jumps.', lines: [4, 9] }],
};

describe('OriginPanel', () => {
  it('tells the file, what was done with it and every warning with its lines', () => {
    render(<OriginPanel origin={{ index: origin }} />);
    expect(screen.getByText('k changed its sign.')).toBeTruthy();
    expect(screen.getByText('n jumps. Lines 4, 9.')).toBeTruthy();
    expect(screen.getByRole('link').getAttribute('href')).toBe('/api/v1/imports/i1/file');
    expect(document.body.textContent).toContain('film.csv, 1,200 rows.');
  });

  it('tells one import of both constants once, and two imports twice', () => {
    const { rerender } = render(<OriginPanel origin={{ index: origin, voigt: { ...origin } }} />);
    expect(screen.getAllByRole('link')).toHaveLength(1);
    rerender(<OriginPanel origin={{ index: origin, voigt: { ...origin, importId: 'i2', warnings: [] } }} />);
    expect(screen.getAllByRole('link')).toHaveLength(2);
    expect(document.body.textContent).toContain('Nothing looked doubtful');
  });
});
