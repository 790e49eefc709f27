import { useCallback, useEffect, useState } from 'react';
import { useNavigation, useSearchParams } from 'react-router-dom';
import type { WorkingPoint } from '../../../../shared/stack.ts';
import { readView, writeView } from '../model/viewState.ts';
import type { ViewState } from '../model/viewState.ts';

/** Browsers refuse an address that changes at every step of a drag. */
const WRITE_AFTER_MS = 250;

/**
 * The view of the stack page, kept in the address: it changes at once on the page and a moment later there. Going
 * back, or a link to another view, is taken over.
 */
export function useView(saved: WorkingPoint): [ViewState, (change: Partial<ViewState>) => void] {
  const [search, setSearch] = useSearchParams();
  const address = search.toString();
  // While the code of another page is fetched, a new address of this one would take the way there back.
  const leaving = useNavigation().state !== 'idle';
  const [view, setView] = useState(() => readView(search, saved));
  const [seen, setSeen] = useState(address);
  const [written, setWritten] = useState(address);

  if (address !== seen) {
    setSeen(address);
    // Our own write arrives when the view may already be further on.
    if (address !== written) setView(readView(search, saved));
  }
  useEffect(() => {
    if (leaving) return undefined;
    const timer = setTimeout(() => {
      const next = writeView(view, saved);
      if (next.toString() === address) return;
      setWritten(next.toString());
      setSearch(next, { replace: true, preventScrollReset: true });
    }, WRITE_AFTER_MS);
    return () => clearTimeout(timer);
  }, [view, saved, address, setSearch, leaving]);

  const change = useCallback((part: Partial<ViewState>) => setView((now) => ({ ...now, ...part })), []);
  return [view, change];
}
