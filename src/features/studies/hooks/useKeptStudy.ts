import { useEffect } from 'react';
import { storeDraft } from '../model/draft.ts';
import type { StoredStudyDraft } from '../model/draft.ts';

/** Keeps unsaved edits over a reload of this tab, and has the browser ask before the tab is closed. */
export function useKeptStudy(studyId: string, stored: StoredStudyDraft | null): void {
  const dirty = stored !== null;
  useEffect(() => {
    const keep = () => storeDraft(window.sessionStorage, studyId, stored);
    // What is saved must not come back as unsaved, however soon the page goes.
    if (stored === null) return keep();
    const timer = setTimeout(keep, 200);
    window.addEventListener('pagehide', keep);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('pagehide', keep);
    };
  }, [studyId, stored]);
  useEffect(() => {
    if (!dirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [dirty]);
}
