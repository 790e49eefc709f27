// @vitest-environment jsdom
// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { startTestServer } from '../../../lib/testServer.ts';
import { sessionQuery } from '../api/session.ts';
import { SignInForm } from './SignInForm.tsx';

afterEach(cleanup);
const server = startTestServer();

const session = {
  user: { id: 'u1', name: 'Ilka Varga', email: 'lead@northgate.example', isSiteAdministrator: false },
  groups: [],
};

function setUp() {
  const client = createQueryClient();
  const onSignedIn = vi.fn();
  render(
    <QueryClientProvider client={client}>
      <SignInForm onSignedIn={onSignedIn} />
    </QueryClientProvider>,
  );
  return { client, onSignedIn, user: userEvent.setup() };
}

const email = () => screen.getByLabelText<HTMLInputElement>('E-mail');
const password = () => screen.getByLabelText<HTMLInputElement>('Password');
const press = () => screen.getByRole('button', { name: 'Sign in' });

function describedBy(field: HTMLElement): string {
  const id = field.getAttribute('aria-describedby') ?? '';
  return document.getElementById(id)?.textContent ?? '';
}

describe('SignInForm', () => {
  it('says at each field what is wrong, asks nobody, and goes to the first', async () => {
    const asked = vi.fn();
    server.answer(asked);
    const { user } = setUp();
    await user.type(email(), 'lead');
    await user.click(press());
    await waitFor(() => expect(email().getAttribute('aria-invalid')).toBe('true'));
    expect(describedBy(email())).toContain('Must be an e-mail address');
    expect(describedBy(password())).toContain('Must not be empty');
    expect(document.activeElement).toBe(email());
    expect(asked).not.toHaveBeenCalled();
  });

  it("shows the server's issue at its field", async () => {
    const issues = [{ path: 'email', message: 'is locked until tomorrow' }];
    server.answerJson(422, { error: { code: 'invalid', message: 'Not signed in.', issues } });
    const { user, onSignedIn } = setUp();
    await user.type(email(), 'lead@northgate.example');
    await user.type(password(), 'northgate-demo');
    await user.click(press());
    await waitFor(() => expect(describedBy(email())).toContain('Is locked until tomorrow'));
    expect(screen.getByRole('alert', { hidden: true }).textContent).toBe('');
    expect(onSignedIn).not.toHaveBeenCalled();
  });

  it('shows a refusal of no single field above the button and keeps what was typed', async () => {
    server.answerJson(401, { error: { code: 'unauthenticated', message: 'E-mail or password is wrong.' } });
    const { user } = setUp();
    await user.type(email(), 'lead@northgate.example');
    await user.type(password(), 'northgate');
    await user.click(press());
    await waitFor(() => expect(screen.getByRole('alert').textContent).toBe('E-mail or password is wrong.'));
    expect(email().value).toBe('lead@northgate.example');
  });

  it('keeps the session that the server gives and says that it is done', async () => {
    server.answerJson(200, session);
    const { user, client, onSignedIn } = setUp();
    await user.type(email(), 'lead@northgate.example');
    await user.type(password(), 'northgate-demo{Enter}');
    await waitFor(() => expect(onSignedIn).toHaveBeenCalledTimes(1));
    expect(client.getQueryData(sessionQuery().queryKey)).toEqual(session);
  });
});
