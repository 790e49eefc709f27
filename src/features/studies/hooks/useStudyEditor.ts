import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useMemo, useRef, useState } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { Study } from '../../../../shared/study.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useSaveStudy } from '../api/changeStudy.ts';
import { studyQuery } from '../api/study.ts';
import { contentOf, draftOf, loadDraft, sameContent, storeDraft } from '../model/draft.ts';
import type { StudyDraft } from '../model/draft.ts';
import type { StudyRow } from '../model/rows.ts';
import { useKeptInTab } from '../../../lib/useKeptInTab.ts';

/**
 * The study being edited: what of it is saved, and what to do when somebody else saved first.
 *
 * @param study the newest version known; a newer one is taken over while there are no unsaved edits
 */
export function useStudyEditor(study: Study) {
  const [base, setBase] = useState(() => ({ version: study.version, draft: draftOf(study) }));
  const [kept] = useState(() => loadDraft(window.sessionStorage, study.id));
  const [draft, setDraft] = useState<StudyDraft>(kept?.draft ?? base.draft);
  const [startedFrom, setStartedFrom] = useState(kept?.baseVersion ?? study.version);
  const [restored, setRestored] = useState(kept !== null && !sameContent(kept.draft, base.draft));
  const underWay = useRef(false);
  const client = useQueryClient();
  const save = useSaveStudy(study.id);
  const dirty = useMemo(() => !sameContent(draft, base.draft), [draft, base]);

  if (study.version > base.version && !save.isPending) {
    const newest = { version: study.version, draft: draftOf(study) };
    setBase(newest);
    if (!dirty) {
      setDraft(newest.draft);
      setStartedFrom(study.version);
    }
  }
  const unsaved = useMemo(
    () => (dirty ? { baseVersion: startedFrom, draft } : null),
    [dirty, startedFrom, draft],
  );
  useKeptInTab(storeDraft, study.id, unsaved);

  const edit = useCallback((change: Partial<StudyDraft>) => setDraft((now) => ({ ...now, ...change })), []);
  const editRows = useCallback(
    (change: (rows: readonly StudyRow[]) => StudyRow[]) =>
      setDraft((now) => ({ ...now, rows: change(now.rows) })),
    [],
  );

  const saveOver = async (version: number) => {
    // A second press before the first is answered would be a conflict with oneself.
    if (!dirty || underWay.current) return;
    underWay.current = true;
    try {
      const saved = await save.mutateAsync({ version, ...contentOf(draft) });
      const stored = draftOf(saved);
      setBase({ version: saved.version, draft: stored });
      // What was typed meanwhile stays.
      setDraft((now) => (now === draft ? stored : now));
      setStartedFrom(saved.version);
      setRestored(false);
    } catch (error) {
      // The refusal says that there is a newer version, not what is in it.
      if (error instanceof ApiError && error.status === 409) {
        await client.invalidateQueries({ queryKey: studyQuery(study.id).queryKey });
      }
    } finally {
      underWay.current = false;
    }
  };

  const refused = save.error instanceof ApiError ? save.error : null;
  return {
    draft,
    dirty,
    restored: restored && dirty,
    saving: save.isPending,
    saveError: refused?.status === 409 ? null : save.error,
    saveIssues: refused?.issues ?? noIssues,
    /** The newer version that somebody else saved under these edits. */
    conflict: dirty && startedFrom < base.version ? { study, since: startedFrom } : null,
    edit,
    editRows,
    save: () => saveOver(startedFrom),
    saveOnTop: () => saveOver(base.version),
    takeSaved: () => {
      setDraft(base.draft);
      setStartedFrom(base.version);
      setRestored(false);
      save.reset();
    },
    dismissRestored: () => setRestored(false),
  };
}

const noIssues: readonly Issue[] = [];

export type StudyEditor = ReturnType<typeof useStudyEditor>;
