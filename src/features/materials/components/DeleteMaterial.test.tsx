// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { startTestServer } from '../../../lib/testServer.ts';
import { buildMaterial } from '../materialFixtures.ts';
import { DeleteMaterial } from './DeleteMaterial.tsx';

afterEach(cleanup);
const server = startTestServer();

const uses = {
  stacks: [{ id: 's1', name: 'Capped cobalt', versions: [2] }],
  runs: [],
  designs: [],
  materials: [],
};
const refusal = { error: { code: 'conflict', message: 'This material is in use.' } };

/** Answers DELETE as told and GET with the uses. */
function answerDelete(status: number) {
  server.answer((request, response) => {
    const refused = request.method === 'DELETE' && status !== 204;
    response.writeHead(request.method === 'DELETE' ? status : 200, { 'content-type': 'application/json' });
    response.end(refused ? JSON.stringify(refusal) : request.method === 'GET' ? JSON.stringify(uses) : '');
  });
}

async function deleteIt() {
  const user = userEvent.setup();
  const onDeleted = vi.fn();
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <DeleteMaterial material={buildMaterial({ groupId: 'g' })} groupId="g" onDeleted={onDeleted} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  await user.click(screen.getByRole('button', { name: 'Delete' }));
  await user.click(screen.getByRole('button', { name: 'Delete material' }));
  return onDeleted;
}

describe('DeleteMaterial', () => {
  it('asks, deletes and says so', async () => {
    answerDelete(204);
    const onDeleted = await deleteIt();
    await vi.waitFor(() => expect(onDeleted).toHaveBeenCalledOnce());
  });

  it('shows what uses the material when it is refused', async () => {
    answerDelete(409);
    const onDeleted = await deleteIt();
    const link = await screen.findByRole('link', { name: 'Capped cobalt' });
    expect(link.getAttribute('href')).toBe('/stacks/s1');
    expect(screen.getByRole('alert').textContent).toContain('in use');
    expect(onDeleted).not.toHaveBeenCalled();
  });
});
