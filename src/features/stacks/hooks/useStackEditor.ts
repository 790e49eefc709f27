import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useMemo, useRef, useState } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { Stack, StackDocument } from '../../../../shared/stack.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useSaveCopy } from '../api/saveCopy.ts';
import { useSaveStack } from '../api/saveStack.ts';
import { stackQuery } from '../api/stack.ts';
import { draftOf, loadDraft, sameDraft, storeDraft } from '../model/draft.ts';
import type { Draft } from '../model/draft.ts';
import { closeStep, recordEdit, redo, startHistory, undo } from '../model/history.ts';
import type { History } from '../model/history.ts';
import { useKeptInTab } from '../../../lib/useKeptInTab.ts';

type Base = { version: number; draft: Draft };

/** Names one edit, so that typing on in the same place is one step of undo; null is a step of its own. */
export type EditName = string | null;
export type EditDocument = (change: (document: StackDocument) => StackDocument, edit: EditName) => void;

/**
 * The stack being edited: its history, what of it is saved, and what to do when somebody else saved first.
 *
 * @param stack the newest version known; a newer one is taken over while there are no unsaved edits
 */
export function useStackEditor(stack: Stack) {
  const [base, setBase] = useState<Base>(() => ({ version: stack.version, draft: draftOf(stack) }));
  const [kept] = useState(() => loadDraft(window.sessionStorage, stack.id));
  const [history, setHistory] = useState<History<Draft>>(() => startHistory(kept?.draft ?? base.draft));
  const [restored, setRestored] = useState(kept !== null && !sameDraft(kept.draft, base.draft));
  const [startedFrom, setStartedFrom] = useState(kept?.baseVersion ?? stack.version);
  const client = useQueryClient();
  const underWay = useRef(false);
  const save = useSaveStack(stack.id);
  const copy = useSaveCopy(stack.groupId);

  const draft = history.present;
  const dirty = useMemo(() => !sameDraft(draft, base.draft), [draft, base.draft]);

  if (stack.version > base.version && !save.isPending) {
    const newest = { version: stack.version, draft: draftOf(stack) };
    setBase(newest);
    if (!dirty) {
      setHistory(startHistory(newest.draft));
      setStartedFrom(stack.version);
    }
  }
  const unsaved = useMemo(
    () => (dirty ? { baseVersion: startedFrom, draft } : null),
    [dirty, startedFrom, draft],
  );
  useKeptInTab(storeDraft, stack.id, unsaved);

  const editDraft = useCallback((change: (draft: Draft) => Draft, edit: EditName) => {
    setHistory((now) => recordEdit(now, change(now.present), edit));
  }, []);
  const editDocument = useCallback<EditDocument>(
    (change, edit) => editDraft((now) => ({ ...now, document: change(now.document) }), edit),
    [editDraft],
  );

  const saveOver = async (version: number) => {
    // A second press before the first is answered would be a conflict with oneself.
    if (!dirty || underWay.current) return;
    underWay.current = true;
    setHistory(closeStep);
    try {
      const saved = await save.mutateAsync({ version, ...draft });
      // The server names the version of every material; what was typed meanwhile stays.
      const stored = draftOf(saved);
      setBase({ version: saved.version, draft: stored });
      setHistory((now) => (now.present === draft ? { ...now, present: stored } : now));
      setStartedFrom(saved.version);
      setRestored(false);
    } catch (error) {
      // The refusal says that there is a newer version, not what is in it.
      if (error instanceof ApiError && error.status === 409) {
        await client.invalidateQueries({ queryKey: stackQuery(stack.id).queryKey });
      }
    } finally {
      underWay.current = false;
    }
  };
  const takeNewest = () => {
    setHistory((now) => recordEdit(now, base.draft, null));
    setStartedFrom(base.version);
    setRestored(false);
    save.reset();
  };

  const refused = save.error instanceof ApiError ? save.error : null;
  return {
    draft,
    dirty,
    restored: restored && dirty,
    version: base.version,
    saving: save.isPending,
    saveError: refused?.status === 409 ? null : save.error,
    saveIssues: refused?.issues ?? noIssues,
    /** The newer version that somebody else saved under these edits. */
    conflict: dirty && startedFrom < base.version ? stack : null,
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    editDraft,
    editDocument,
    undo: useCallback(() => setHistory(undo), []),
    redo: useCallback(() => setHistory(redo), []),
    save: () => saveOver(startedFrom),
    saveOnTop: () => saveOver(base.version),
    takeNewest,
    dismissRestored: () => setRestored(false),
    saveAsCopy: async (name: string) => {
      const created = await copy.mutateAsync({ ...draft, name });
      setHistory(startHistory(base.draft));
      storeDraft(window.sessionStorage, stack.id, null);
      return created;
    },
    copying: copy.isPending,
    copyError: copy.error,
  };
}

const noIssues: readonly Issue[] = [];

export type StackEditor = ReturnType<typeof useStackEditor>;
