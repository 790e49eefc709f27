import { useEffect } from 'react';

/**
 * Keeps unsaved edits over a reload of this tab, and has the browser ask before the tab is closed.
 *
 * @param store writes the edits under a key, or takes them away; the same function at every call
 * @param kept null when there is nothing unsaved
 */
export function useKeptInTab<Kept>(
  store: (storage: Storage, key: string, kept: Kept | null) => void,
  key: string,
  kept: Kept | null,
): void {
  const dirty = kept !== null;
  useEffect(() => {
    const keep = () => store(window.sessionStorage, key, kept);
    // What is saved must not come back as unsaved, however soon the page goes.
    if (kept === null) return keep();
    // A large document is not written at every keystroke, but always before the page goes.
    const timer = setTimeout(keep, 200);
    window.addEventListener('pagehide', keep);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('pagehide', keep);
    };
  }, [store, key, kept]);
  useEffect(() => {
    if (!dirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [dirty]);
}
