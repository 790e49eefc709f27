import { useEffect } from 'react';
import { storeForm } from '../model/keptForm.ts';
import type { KeptForm } from '../model/keptForm.ts';

/** Keeps unsaved edits over a reload of this tab, and has the browser ask before the tab is closed. */
export function useKeptForm(subject: string, kept: KeptForm | null): void {
  const dirty = kept !== null;
  useEffect(() => {
    const keep = () => storeForm(window.sessionStorage, subject, kept);
    // What is saved must not come back as unsaved, however soon the page goes.
    if (kept === null) return keep();
    // A large table is not written at every keystroke, but always before the page goes.
    const timer = setTimeout(keep, 200);
    window.addEventListener('pagehide', keep);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('pagehide', keep);
    };
  }, [subject, kept]);
  useEffect(() => {
    if (!dirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [dirty]);
}
