import type { MaterialVersion } from '../../shared/materialEdit.ts';
import type { Material } from '../models/material.ts';
import { materialChanges } from './materialChanges.ts';
import type { MaterialStore } from './materialStore.ts';

/** Every version with who made it and what it changed, newest first. */
export async function materialHistory(store: MaterialStore, material: Material): Promise<MaterialVersion[]> {
  const history: MaterialVersion[] = [];
  // One after the other: two contents at a time are enough in memory.
  for (let version = 1; version <= material.version; version += 1) {
    const stored = await store.versionOf(material.id, version);
    const before = version > 1 ? await store.contentOf(material.id, version - 1) : null;
    if (!stored) throw new Error(`Material ${material.id} has no version ${version}`);
    history.unshift({
      version,
      madeAt: stored.madeAt.toISOString(),
      author: stored.author,
      note: stored.note,
      changes: before ? materialChanges(before, stored.content) : [],
    });
  }
  return history;
}
