import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { noFilter, readFilter, writeFilter } from '../model/materialFilter.ts';
import type { MaterialFilter } from '../model/materialFilter.ts';

/** The filter as the address holds it, so that a link shows the same rows; null shows everything. */
export function useMaterialFilter(): [MaterialFilter, (change: Partial<MaterialFilter> | null) => void] {
  const [search, setSearch] = useSearchParams();
  const filter = useMemo(() => readFilter(search), [search]);
  const change = (part: Partial<MaterialFilter> | null) =>
    setSearch(writeFilter(part === null ? noFilter : { ...filter, ...part }), { replace: true });
  return [filter, change];
}
