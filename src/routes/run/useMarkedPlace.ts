import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { readMarkedPlace } from './markedPlace.ts';
import type { MarkedPlace } from './markedPlace.ts';

/** The marked value of a stored run, kept in the address so that a link and a pinned plot restore it. */
export function useMarkedPlace(): [MarkedPlace, (change: Partial<MarkedPlace>) => void] {
  const [search, setSearch] = useSearchParams();
  const marked = useMemo(() => readMarkedPlace(search), [search]);
  const change = (part: Partial<MarkedPlace>) => {
    const next = new URLSearchParams(search);
    for (const [key, value] of Object.entries(part)) {
      if (value === null) next.delete(key);
      else next.set(key, String(value));
    }
    setSearch(next, { replace: true, preventScrollReset: true });
  };
  return [marked, change];
}
