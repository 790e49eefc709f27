// @vitest-environment jsdom
import { QueryClientProvider, useQuery } from '@tanstack/react-query';
import { act, cleanup, renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Stack } from '../../../../shared/stack.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { stackQuery } from '../api/stack.ts';
import { loadDraft } from '../model/draft.ts';
import { withLayer } from '../model/items.ts';
import { buildDocument } from '../model/stackFixtures.ts';
import { useStackEditor } from './useStackEditor.ts';

function buildStack(overrides: Partial<Stack> = {}): Stack {
  return {
    id: 'stack',
    groupId: 'group',
    name: 'Film',
    description: '',
    version: 4,
    layerCount: 3,
    isDemo: false,
    updatedAt: '2026-03-01T10:00:00.000Z',
    updatedBy: 'A. Grower',
    document: buildDocument(),
    ...overrides,
  };
}

/** What a server that keeps versions would answer: a save over an older version than its own is a conflict. */
function serve(start: Stack) {
  let stored = start;
  let saved = (document: Stack['document']) => document;
  const answer = (status: number, body: unknown) =>
    new Response(JSON.stringify(body), { status, headers: { 'content-type': 'application/json' } });
  vi.stubGlobal('fetch', (_path: string, init: { method?: string; body?: string } = {}) => {
    if (init.method !== 'PATCH') return Promise.resolve(answer(200, stored));
    const body = JSON.parse(init.body ?? '{}') as Partial<Stack>;
    if (body.version !== stored.version) {
      return Promise.resolve(
        answer(409, { error: { code: 'conflict', message: 'There is a newer version.' } }),
      );
    }
    const next = { ...stored, ...body, version: stored.version + 1 };
    stored = { ...next, document: saved(next.document) };
    return Promise.resolve(answer(200, stored));
  });
  return {
    stored: () => stored,
    /** What the server makes of a document when it is saved. */
    onSave: (change: typeof saved) => (saved = change),
    /** Somebody else saves. */
    saveElsewhere: (change: Partial<Stack>) => {
      stored = { ...stored, ...change, version: stored.version + 1 };
    },
  };
}

function edit(stack: Stack) {
  const client = createQueryClient();
  client.setQueryData(stackQuery(stack.id).queryKey, stack);
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  return renderHook(
    () => {
      const { data = stack } = useQuery({ ...stackQuery(stack.id), staleTime: Infinity });
      return useStackEditor(data);
    },
    { wrapper },
  );
}

const thicker = (thicknessNm: number) => (document: Stack['document']) =>
  withLayer(document, 'pt', { thicknessNm });

beforeEach(() => window.sessionStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('useStackEditor', () => {
  it('knows what is saved, and undo back to it is saved again', async () => {
    const server = serve(buildStack());
    const { result } = edit(buildStack());
    act(() => result.current.editDocument(thicker(4), 'thickness of pt'));
    expect(result.current.dirty).toBe(true);
    act(() => result.current.undo());
    expect(result.current.dirty).toBe(false);
    act(() => result.current.redo());
    await act(() => result.current.save());
    expect(server.stored().document.layers[0]).toMatchObject({ thicknessNm: 4 });
    expect(result.current).toMatchObject({ dirty: false, version: 5, conflict: null });
  });

  it('takes over the versions that the server names for materials without one', async () => {
    const unnamed = { material: 'pt' };
    const start = buildStack({ document: buildDocument({ substrate: unnamed }) });
    const server = serve(start);
    server.onSave((document) => ({ ...document, substrate: { ...unnamed, version: 7 } }));
    const { result } = edit(start);
    act(() => result.current.editDocument(thicker(4), null));
    await act(() => result.current.save());
    expect(result.current.draft.document.substrate).toEqual({ material: 'pt', version: 7 });
    expect(result.current).toMatchObject({ dirty: false, version: 5, conflict: null });
  });

  it('saves once however often it is pressed, and not at all when there is nothing to save', async () => {
    const server = serve(buildStack());
    const { result } = edit(buildStack());
    await act(() => result.current.save());
    expect(server.stored().version).toBe(4);
    act(() => result.current.editDocument(thicker(4), null));
    const { save } = result.current;
    await act(() => Promise.all([save(), save()]));
    expect(server.stored().version).toBe(5);
    expect(result.current).toMatchObject({ dirty: false, conflict: null, saveError: null });
  });

  it('keeps the edits when somebody else saved first, and saves them on top', async () => {
    const server = serve(buildStack());
    const { result } = edit(buildStack());
    act(() => result.current.editDocument(thicker(4), null));
    server.saveElsewhere({ name: 'Renamed' });
    await act(() => result.current.save());
    await waitFor(() => expect(result.current.conflict?.version).toBe(5));
    expect(result.current.conflict?.name).toBe('Renamed');
    expect(result.current.draft.document.layers[0]).toMatchObject({ thicknessNm: 4 });
    expect(server.stored().document.layers[0]).toMatchObject({ thicknessNm: 3 });
    await act(() => result.current.saveOnTop());
    expect(server.stored()).toMatchObject({ version: 6, name: 'Film' });
    expect(result.current).toMatchObject({ dirty: false, conflict: null, version: 6 });
  });

  it('takes theirs instead, which undo can take back', async () => {
    const server = serve(buildStack());
    const { result } = edit(buildStack());
    act(() => result.current.editDocument(thicker(4), null));
    server.saveElsewhere({ name: 'Renamed' });
    await act(() => result.current.save());
    await waitFor(() => expect(result.current.conflict).not.toBeNull());
    act(() => result.current.takeNewest());
    expect(result.current).toMatchObject({ dirty: false, conflict: null, draft: { name: 'Renamed' } });
    act(() => result.current.undo());
    expect(result.current.draft.document.layers[0]).toMatchObject({ thicknessNm: 4 });
  });

  it('brings unsaved edits back after a reload of the tab, until they are saved', async () => {
    serve(buildStack());
    const before = edit(buildStack());
    act(() => before.result.current.editDocument(thicker(7), null));
    await waitFor(() => expect(loadDraft(window.sessionStorage, 'stack')).not.toBeNull());
    before.unmount();
    const { result } = edit(buildStack());
    expect(result.current).toMatchObject({ dirty: true, restored: true });
    expect(result.current.draft.document.layers[0]).toMatchObject({ thicknessNm: 7 });
    await act(() => result.current.save());
    expect(loadDraft(window.sessionStorage, 'stack')).toBeNull();
  });

  it('says which field a refused save is about and keeps the edits', async () => {
    vi.stubGlobal('fetch', () =>
      Promise.resolve(
        new Response(
          JSON.stringify({
            error: {
              code: 'invalid',
              message: 'The stack cannot be saved.',
              issues: [{ path: 'name', message: 'must not be empty' }],
            },
          }),
          { status: 422 },
        ),
      ),
    );
    const { result } = edit(buildStack());
    act(() => result.current.editDraft((draft) => ({ ...draft, name: '' }), 'name'));
    await act(() => result.current.save());
    expect(result.current.saveIssues).toEqual([{ path: 'name', message: 'must not be empty' }]);
    expect(result.current.dirty).toBe(true);
  });
});
