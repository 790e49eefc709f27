// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, it, vi } from 'vitest';
import type { CreateRun, Run } from '../../../../shared/run.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { KeepAsRun } from './KeepAsRun.tsx';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const body: CreateRun = {
  groupId: 'group',
  document: {
    incident: { index: 1 },
    layers: [],
    substrate: { index: 3.88 },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 60, input: 'p', magnetization: { mode: 'drawn' } },
  },
  axis: { kind: 'angle', from: 0, to: 89, points: 1_000_000, spacing: 'linear' },
  readings: ['reflectanceP'],
};

const made: Run = {
  id: 'run',
  groupId: 'group',
  name: 'angle',
  stackId: null,
  stackName: null,
  axis: body.axis,
  progress: { state: 'queued', done: 0, total: 1_000_000, secondsLeft: null, error: null },
  createdAt: '2026-03-01T10:00:00.000Z',
  finishedAt: null,
  createdBy: null,
  isDemo: false,
  document: body.document,
  readings: ['reflectanceP'],
  materials: [],
  warnings: [],
  assumptions: [],
  solverVersion: '1.0.0',
  inputSha256: 'abc',
  computeSeconds: null,
};

function show(answers: (() => Promise<Response>)[]) {
  const sent: (string | null)[] = [];
  vi.stubGlobal('fetch', (_path: string, init: RequestInit) => {
    sent.push(new Headers(init.headers).get('idempotency-key'));
    return answers[sent.length - 1]!();
  });
  const onKept = vi.fn();
  render(
    <QueryClientProvider client={createQueryClient()}>
      <KeepAsRun body={body} problem={false} onKept={onKept} />
    </QueryClientProvider>,
  );
  return {
    sent,
    onKept,
    user: userEvent.setup(),
    button: screen.getByRole('button', { name: 'Keep as run' }),
  };
}

it('makes one run of a double click', async () => {
  const { sent, onKept, user, button } = show([
    () => new Promise((resolve) => setTimeout(() => resolve(Response.json(made, { status: 201 })), 30)),
  ]);
  await user.dblClick(button);
  await waitFor(() => expect(onKept).toHaveBeenCalledOnce());
  expect(sent).toHaveLength(1);
  expect(sent[0]).toMatch(/^[\w-]{20,}$/);
});

it('shows why a run was refused, field by field, and sends a new key with the next press', async () => {
  const refusal = {
    error: {
      code: 'invalid',
      message: 'The run cannot be computed.',
      issues: [{ path: 'document.layers[0].material', message: 'Q of Cobalt is known at 632.8 nm only' }],
    },
  };
  const { sent, onKept, user, button } = show([
    () => Promise.resolve(Response.json(refusal, { status: 422 })),
    () => Promise.resolve(Response.json(made, { status: 201 })),
  ]);
  await user.click(button);
  const alert = await screen.findByRole('alert');
  expect(alert.textContent).toContain('document.layers[0].material: Q of Cobalt is known at 632.8 nm only');
  await user.click(button);
  await waitFor(() => expect(onKept).toHaveBeenCalledOnce());
  expect(new Set(sent).size).toBe(2);
});
