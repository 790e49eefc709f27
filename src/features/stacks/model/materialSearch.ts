import type { MaterialSummary } from '../../../../shared/material.ts';

/**
 * The library in the order in which a person looks for a material: formula as typed, formula or name that begins so,
 * then anything that has the words; the preferred source of a substance first.
 */
export function searchMaterials(materials: readonly MaterialSummary[], query: string): MaterialSummary[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  const ranked = materials.flatMap((material) => {
    const text = `${material.formula} ${material.name} ${material.citation} ${material.class}`.toLowerCase();
    if (!words.every((word) => text.includes(word))) return [];
    return [{ material, rank: rankOf(material, words.join(' ')) }];
  });
  ranked.sort(
    (a, b) =>
      a.rank - b.rank ||
      Number(b.material.preferred) - Number(a.material.preferred) ||
      a.material.formula.localeCompare(b.material.formula) ||
      a.material.name.localeCompare(b.material.name),
  );
  return ranked.map(({ material }) => material);
}

function rankOf(material: MaterialSummary, query: string): number {
  if (query === '') return 0;
  const [formula, name] = [material.formula.toLowerCase(), material.name.toLowerCase()];
  if (formula === query) return 0;
  if (formula.startsWith(query) || name.startsWith(query)) return 1;
  return 2;
}
