import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { materialClasses } from '../../../../shared/material.ts';
import type { MaterialClass, MaterialSummary } from '../../../../shared/material.ts';

export type MaterialFilter = {
  /** Words that must all occur in name, formula or citation. */
  words: string;
  class: MaterialClass | 'all';
  magnetoOptic: boolean;
};

export function filterMaterials(
  materials: readonly MaterialSummary[],
  filter: MaterialFilter,
): MaterialSummary[] {
  const words = filter.words.toLowerCase().split(/\s+/).filter(Boolean);
  return materials.filter((material) => {
    const text = `${material.name} ${material.formula} ${material.citation} ${material.id}`.toLowerCase();
    return (
      words.every((word) => text.includes(word)) &&
      (filter.class === 'all' || material.class === filter.class) &&
      (!filter.magnetoOptic || material.voigtRangeNm !== null)
    );
  });
}

/** The filter as the address holds it, so that a link shows the same rows. */
export function useMaterialFilter(): [MaterialFilter, (change: Partial<MaterialFilter>) => void] {
  const [search, setSearch] = useSearchParams();
  const filter = useMemo<MaterialFilter>(
    () => ({
      words: search.get('q') ?? '',
      class: materialClasses.find((one) => one === search.get('class')) ?? 'all',
      magnetoOptic: search.get('mo') === '1',
    }),
    [search],
  );
  const change = (part: Partial<MaterialFilter>) => {
    const next = { ...filter, ...part };
    const params = new URLSearchParams();
    if (next.words) params.set('q', next.words);
    if (next.class !== 'all') params.set('class', next.class);
    if (next.magnetoOptic) params.set('mo', '1');
    setSearch(params, { replace: true });
  };
  return [filter, change];
}
