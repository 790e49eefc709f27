import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { readReadingView, writeReadingView } from '../../components/plot/readingView.ts';
import type { ReadingView } from '../../components/plot/readingView.ts';
import { relations } from '../../features/compare/model/curveDifference.ts';
import type { Relation } from '../../features/compare/model/curveDifference.ts';

/** What of a comparison the address holds, and how it is changed without a step in the history. */
export function useCompareAddress() {
  const [search, setSearch] = useSearchParams();
  return useMemo(() => {
    const view = readReadingView(search);
    const write = (edit: (next: URLSearchParams) => void) => {
      const next = new URLSearchParams(search);
      edit(next);
      setSearch(next, { replace: true, preventScrollReset: true });
    };
    const change = (key: string, value: string | null) =>
      write((next) => (value === null ? next.delete(key) : next.set(key, value)));
    return {
      view,
      relation: relations.find((one) => one === search.get('against')) ?? 'difference',
      beside: search.get('beside'),
      change,
      changeView: (part: Partial<ReadingView>) =>
        write((next) => writeReadingView({ ...view, ...part }, next)),
      changeRelation: (next: Relation) => change('against', next === 'ratio' ? next : null),
    };
  }, [search, setSearch]);
}
