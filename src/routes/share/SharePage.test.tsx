// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import { RouterProvider, createMemoryRouter } from 'react-router-dom';
import { afterEach, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../lib/queryClient.ts';
import { SharePage } from './SharePage.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function open(status: number, code: string) {
  vi.stubGlobal('fetch', () =>
    Promise.resolve(Response.json({ error: { code, message: 'The server says no.' } }, { status })),
  );
  const router = createMemoryRouter([{ path: '/share/:token', Component: SharePage }], {
    initialEntries: ['/share/abc'],
  });
  render(
    <QueryClientProvider client={createQueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
}

it('tells a reader with a revoked or expired link whom to ask', async () => {
  open(410, 'gone');
  expect((await screen.findByRole('heading', { level: 1, name: 'This link no longer opens' })).tagName).toBe(
    'H1',
  );
  expect(screen.getByText(/ask the person who sent you the link/)).toBeTruthy();
});

it('tells a reader with an address that never was to check it', async () => {
  open(404, 'not-found');
  expect(await screen.findByRole('heading', { level: 1, name: 'There is no such link' })).toBeTruthy();
});

it('lets a reader try again after any other failure', async () => {
  open(403, 'forbidden');
  expect(await screen.findByRole('button', { name: 'Try again' })).toBeTruthy();
});
