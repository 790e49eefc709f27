// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { startTestServer } from '../../../lib/testServer.ts';
import { VersionList } from './VersionList.tsx';

afterEach(cleanup);
const server = startTestServer();

describe('VersionList', () => {
  it('says who changed what, and leads to every version but the one shown', async () => {
    const madeAt = '2026-03-01T09:00:00.000Z';
    server.answerJson(200, {
      versions: [
        { version: 2, madeAt, author: 'I. Varga', note: 'New film', changes: ['Q is a table now.'] },
        { version: 1, madeAt, author: null, note: '', changes: [] },
      ],
    });
    render(
      <QueryClientProvider client={createQueryClient()}>
        <MemoryRouter>
          <VersionList materialId="co" shown={2} />
        </MemoryRouter>
      </QueryClientProvider>,
    );
    const [newer, older] = await screen
      .findAllByRole('listitem')
      .then((items) => items.filter((item) => item.parentElement?.tagName === 'OL'));
    expect(newer?.getAttribute('aria-current')).toBe('true');
    expect(newer?.textContent).toMatch(/I\. Varga.*New film.*Q is a table now\./s);
    expect(older?.textContent).toContain('shipped with the program');
    const links = screen.getAllByRole('link').map((link) => link.getAttribute('href'));
    expect(links).toEqual(['/materials/co?version=1']);
  });
});
