// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { act, cleanup, renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import type { Study } from '../../../../shared/study.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { useStudyEditor } from './useStudyEditor.ts';

const study: Study = {
  id: 'study',
  groupId: 'group',
  title: 'Cap',
  question: 'Which cap?',
  version: 3,
  itemCount: 1,
  decided: null,
  isDemo: false,
  updatedAt: '2026-03-01T10:00:00.000Z',
  updatedBy: 'Ada',
  document: { question: 'Which cap?', items: [{ kind: 'note', id: 'a', text: 'first' }], decision: '' },
};

beforeEach(() => window.sessionStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function openEditor(answer: (body: unknown) => Response = () => Response.json(study)) {
  const sent: unknown[] = [];
  vi.stubGlobal('fetch', (_path: string, init: RequestInit) => {
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : undefined;
    if (body !== undefined) sent.push(body);
    return Promise.resolve(answer(body));
  });
  const client = createQueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  const rendered = renderHook(({ newest }) => useStudyEditor(newest), {
    wrapper,
    initialProps: { newest: study },
  });
  return { ...rendered, sent };
}

it('sends the version it started from and is clean once the answer is there', async () => {
  const saved: Study = { ...study, version: 4, document: { ...study.document, decision: 'Pt, 2 nm.' } };
  const { result, sent } = openEditor(() => Response.json(saved));
  act(() => result.current.edit({ decision: 'Pt, 2 nm.' }));
  expect(result.current.dirty).toBe(true);
  await act(() => result.current.save());
  expect(sent).toEqual([{ version: 3, title: 'Cap', document: saved.document }]);
  expect(result.current.dirty).toBe(false);
});

it('keeps the edits when somebody else saved first, and can put them on top', async () => {
  const refusal = { error: { code: 'conflict', message: 'There is a newer version.' } };
  const { result, rerender, sent } = openEditor((body) =>
    JSON.stringify(body).includes('"version":3')
      ? Response.json(refusal, { status: 409 })
      : Response.json({ ...study, version: 5, title: 'Mine' }),
  );
  act(() => result.current.edit({ title: 'Mine' }));
  await act(() => result.current.save());
  rerender({ newest: { ...study, version: 4, title: 'Theirs', updatedBy: 'Grace' } });
  await waitFor(() => expect(result.current.conflict).not.toBeNull());
  expect(result.current.draft.title).toBe('Mine');
  expect(result.current.saveError).toBeNull();
  await act(() => result.current.saveOnTop());
  expect(sent.at(-1)).toMatchObject({ version: 4, title: 'Mine' });
  expect(result.current.conflict).toBeNull();
});

it('takes a newer version over while there is nothing unsaved', () => {
  const { result, rerender } = openEditor();
  rerender({ newest: { ...study, version: 4, title: 'Theirs' } });
  expect(result.current.draft.title).toBe('Theirs');
  expect(result.current.conflict).toBeNull();
});

it('brings unsaved edits back after a reload, and lets them go', async () => {
  const first = openEditor();
  act(() => first.result.current.edit({ question: '' }));
  await waitFor(() => expect(window.sessionStorage.length).toBe(1));
  first.unmount();
  const { result } = openEditor();
  expect(result.current.restored).toBe(true);
  expect(result.current.draft.question).toBe('');
  act(() => result.current.takeSaved());
  expect(result.current.draft.question).toBe('Which cap?');
  await waitFor(() => expect(window.sessionStorage.length).toBe(0));
});
