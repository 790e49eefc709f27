import type { Material as PresentedMaterial, MaterialSummary } from '../../shared/material.ts';
import type { Material } from '../models/material.ts';
import { materialFacts } from '../services/materialFacts.ts';
import type { MaterialFacts } from '../services/materialFacts.ts';
import type { StoredVersion } from '../services/versionCache.ts';

/** @param version the one that the facts are of, not always the newest */
export function presentMaterialSummary(
  material: Material,
  version: number,
  facts: MaterialFacts,
): MaterialSummary {
  return {
    id: material.id,
    version,
    name: material.name,
    formula: material.formula,
    class: material.class,
    groupId: material.groupId,
    preferred: material.preferred,
    updatedAt: material.updatedAt.toISOString(),
    ...facts,
  };
}

/** @param curves of this version, sampled in the pool */
export function presentMaterial(
  material: Material,
  stored: StoredVersion,
  curves: PresentedMaterial['curves'],
): PresentedMaterial {
  return {
    ...presentMaterialSummary(material, stored.version, materialFacts(stored.content)),
    content: stored.content,
    curves,
    notes: material.notes,
    newestVersion: material.version,
    author: stored.author,
    madeAt: stored.madeAt.toISOString(),
  };
}
