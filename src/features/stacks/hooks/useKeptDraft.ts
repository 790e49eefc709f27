import { useEffect } from 'react';
import { storeDraft } from '../model/draft.ts';
import type { StoredDraft } from '../model/draft.ts';

/** Keeps unsaved edits over a reload of this tab, and has the browser ask before the tab is closed. */
export function useKeptDraft(stackId: string, stored: StoredDraft | null): void {
  const dirty = stored !== null;
  useEffect(() => {
    const keep = () => storeDraft(window.sessionStorage, stackId, stored);
    // What is saved must not come back as unsaved, however soon the page goes.
    if (stored === null) return keep();
    // A large film is not written at every keystroke, but always before the page goes.
    const timer = setTimeout(keep, 200);
    window.addEventListener('pagehide', keep);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('pagehide', keep);
    };
  }, [stackId, stored]);
  useEffect(() => {
    if (!dirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [dirty]);
}
