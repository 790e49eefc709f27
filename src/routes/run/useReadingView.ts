import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { readReadingView, writeReadingView } from '../../components/plot/readingView.ts';
import type { ReadingView } from '../../components/plot/readingView.ts';

/** How the readings of a stored run are shown, kept in the address. */
export function useReadingView(): [ReadingView, (change: Partial<ReadingView>) => void] {
  const [search, setSearch] = useSearchParams();
  const view = useMemo(() => readReadingView(search), [search]);
  const change = (part: Partial<ReadingView>) => {
    const next = new URLSearchParams(search);
    writeReadingView({ ...view, ...part }, next);
    setSearch(next, { replace: true, preventScrollReset: true });
  };
  return [view, change];
}
