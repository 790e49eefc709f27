// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { createDesignSchema } from '../../../../shared/design.ts';
import type { DesignKind } from '../../../../shared/design.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { Stack } from '../../../../shared/stack.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { DesignForm } from './DesignForm.tsx';

beforeEach(() => window.sessionStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const material = (id: string, formula: string): MaterialSummary => ({
  id,
  version: 1,
  name: formula,
  formula,
  class: 'noble',
  groupId: null,
  rangeNm: [200, 1000],
  voigtRangeNm: null,
  preferred: true,
  citation: 'a test',
  confidence: 'from memory',
  voigtConfidence: null,
  indexKind: 'table',
  voigtKind: null,
  anisotropy: null,
  updatedAt: '2026-03-01T10:00:00.000Z',
});
const library = [material('pt', 'Pt'), material('au', 'Au')];

const stack: Stack = {
  id: 'stack',
  groupId: 'group',
  name: 'Pt/Co/Pt',
  description: '',
  version: 1,
  layerCount: 3,
  isDemo: false,
  updatedAt: '2026-03-01T10:00:00.000Z',
  updatedBy: null,
  document: {
    incident: { index: 1 },
    layers: [
      { id: 'cap', medium: { material: 'pt' }, thicknessNm: 3, note: 'cap' },
      {
        id: 'film',
        medium: { index: [2.25, 4.07], voigt: [0.02, 0], label: 'Co' },
        thicknessNm: 1,
        m: [0, 0, 1],
      },
      { id: 'seed', medium: { material: 'pt' }, thicknessNm: 5, note: 'seed' },
    ],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
  },
};

function show(kind: DesignKind) {
  const sent: unknown[] = [];
  vi.stubGlobal('fetch', (_path: string, init: RequestInit) => {
    sent.push(typeof init.body === 'string' ? JSON.parse(init.body) : null);
    const issues = [
      { path: 'input.points[0].workingPoint.wavelengthNm', message: 'Q of Cobalt is known at 632.8 nm only' },
      { path: 'input.candidates[1].layers[0].leastNm', message: 'is beyond the range' },
    ];
    return Promise.resolve(
      Response.json(
        { error: { code: 'invalid', message: 'It cannot be computed.', issues } },
        { status: 422 },
      ),
    );
  });
  const view = render(
    <QueryClientProvider client={createQueryClient()}>
      <DesignForm kind={kind} stack={stack} library={library} pickMaterial={() => null} onStarted={vi.fn()} />
    </QueryClientProvider>,
  );
  return { sent, user: userEvent.setup(), ...view };
}

it('begins with the film’s own working point, its present cap and the usual candidates', async () => {
  const { sent, user } = show('cap');
  expect(screen.getByLabelText('1 Pt (cap)')).toHaveProperty('checked', true);
  await user.click(screen.getByRole('button', { name: 'Compare the caps' }));
  await waitFor(() => expect(sent).toHaveLength(1));
  const { input, stackId } = createDesignSchema.parse(sent[0]);
  expect(stackId).toBe('stack');
  expect(input).toMatchObject({ kind: 'cap', replaces: ['cap'], signal: 'rotation' });
  expect(input.points[0]?.workingPoint).toEqual(stack.document.workingPoint);
  expect(input.kind === 'cap' && input.candidates.map(({ label }) => label)).toEqual(['Pt', 'Au']);
});

it('sends angles in degrees that were typed in mdeg', async () => {
  const { sent, user } = show('cap');
  await user.click(screen.getByLabelText('|Kerr rotation| at least', { selector: 'input[type=checkbox]' }));
  const field = screen.getByRole('spinbutton', { name: '|Kerr rotation| at least' });
  await user.clear(field);
  await user.type(field, '12.5');
  await user.click(screen.getByRole('button', { name: 'Compare the caps' }));
  await waitFor(() => expect(sent).toHaveLength(1));
  expect(createDesignSchema.parse(sent[0]).input).toMatchObject({ demands: { leastRotationDeg: 0.0125 } });
});

it('shows what the server refuses at its field and loses nothing', async () => {
  const { user } = show('cap');
  await user.type(screen.getByLabelText(/^Name \(made/), 'Which cap');
  await user.click(screen.getByRole('button', { name: 'Compare the caps' }));
  const wavelength = screen.getByRole('spinbutton', { name: 'Wavelength' });
  await waitFor(() => expect(wavelength.getAttribute('aria-invalid')).toBe('true'));
  expect(screen.getAllByText(/Q of Cobalt is known at 632.8 nm only/).length).toBe(2);
  const least = screen.getAllByRole('spinbutton', { name: 'Protects from' });
  expect(least.map((field) => field.getAttribute('aria-invalid'))).toEqual([null, 'true']);
  expect(screen.getByLabelText(/^Name \(made/)).toHaveProperty('value', 'Which cap');
});

it('is refused before it is sent where its own rules are broken', async () => {
  const { sent, user } = show('optimise');
  const to = screen.getByRole('spinbutton', { name: 'To' });
  await user.clear(to);
  await user.type(to, '0');
  await user.click(screen.getByRole('button', { name: 'Search the best film' }));
  await waitFor(() => expect(to.getAttribute('aria-invalid')).toBe('true'));
  expect(sent).toHaveLength(0);
});

it('comes back after a reload, values that make no sense included', async () => {
  const first = show('tolerance');
  const rate = screen.getByRole('spinbutton', { name: 'Rate' });
  await first.user.clear(rate);
  await first.user.type(rate, '70');
  first.unmount();
  show('tolerance');
  expect(screen.getByRole('spinbutton', { name: 'Rate' })).toHaveProperty('value', '70');
  expect(screen.getByText(/What you had filled in is back/)).toBeDefined();
});

it('offers a least reflectance with a goal that needs light, which can be cleared and goes with the goal', async () => {
  const { sent, user } = show('optimise');
  const least = () => screen.getByRole('spinbutton', { name: 'Least reflectance' });
  expect(least()).toHaveProperty('value', '0.01');
  expect(screen.getByText(/0.01 is common practice, no source/)).toBeDefined();
  const goal = screen.getByRole('combobox', { name: 'Goal' });
  await user.selectOptions(goal, 'least reflectance');
  expect(least()).toHaveProperty('value', '0');
  await user.selectOptions(goal, 'zero ellipticity');
  expect(least()).toHaveProperty('value', '0.01');
  await user.clear(least());
  await user.type(least(), '0');
  await user.selectOptions(goal, 'rotation');
  await user.click(screen.getByRole('button', { name: 'Search the best film' }));
  await waitFor(() => expect(sent).toHaveLength(1));
  expect(createDesignSchema.parse(sent[0]).input).toMatchObject({ goal: { quantity: 'rotation' } });
  expect(JSON.stringify(sent[0])).not.toContain('leastReflectance');
});
