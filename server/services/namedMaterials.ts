import type { LibrarySolveCase } from '../../shared/solve.ts';
import { forEachMedium } from '../../shared/solveRules.ts';

type NamedMaterial = { material: string; version?: number };

/** Every library material that a case names, in its media and in the parts of its mixtures. */
export function namedMaterials(one: LibrarySolveCase): NamedMaterial[] {
  const named: NamedMaterial[] = [];
  forEachMedium(one, (medium) => {
    for (const { material, version } of [medium, ...(medium.mixture?.parts ?? [])]) {
      if (material !== undefined) named.push({ material, version });
    }
  });
  return named;
}
