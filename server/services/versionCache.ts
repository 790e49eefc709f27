import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialFacts } from './materialFacts.ts';

/** One version as it stands in the database. */
export type StoredVersion = {
  version: number;
  content: MaterialContent;
  /** Null for the shipped library. */
  author: string | null;
  note: string;
  madeAt: Date;
};

/** Table points kept at most, about 60 bytes each: an imported table may have as many as a hundred shipped ones. */
const KEPT_POINTS = 1_000_000;
/** What a version without a table counts as. */
const LEAST_POINTS = 100;
const KEPT_FACTS = 5_000;

/**
 * Versions of materials in memory, the one used last going last. A version never changes; only a material that was
 * deleted leaves one behind, and its id is not given again.
 */
export class VersionCache {
  private readonly versions = new Map<string, StoredVersion>();
  private readonly known = new Map<string, MaterialFacts>();
  private points = 0;

  find(materialId: string, version: number): StoredVersion | undefined {
    const key = `${materialId}@${version}`;
    const found = this.versions.get(key);
    if (found) {
      this.versions.delete(key);
      this.versions.set(key, found);
    }
    return found;
  }

  keep(materialId: string, stored: StoredVersion): StoredVersion {
    const key = `${materialId}@${stored.version}`;
    // Two requests may have read it at once.
    if (this.versions.has(key)) return stored;
    this.versions.set(key, stored);
    this.points += pointsOf(stored.content);
    for (const [oldest, { content }] of this.versions) {
      if (this.points <= KEPT_POINTS || oldest === key) break;
      this.versions.delete(oldest);
      this.points -= pointsOf(content);
    }
    return stored;
  }

  facts(materialId: string, version: number): MaterialFacts | undefined {
    return this.known.get(`${materialId}@${version}`);
  }

  keepFacts(materialId: string, version: number, facts: MaterialFacts): MaterialFacts {
    const [oldest] = this.known.keys();
    if (this.known.size >= KEPT_FACTS && oldest !== undefined) this.known.delete(oldest);
    this.known.set(`${materialId}@${version}`, facts);
    return facts;
  }
}

/** Points of all tables of a content. */
function pointsOf({ index, voigt, anisotropy }: MaterialContent): number {
  const parts = index.kind === 'mixture' ? index.parts : [];
  const tables = [
    index,
    voigt,
    anisotropy?.kind === 'uniaxial' ? anisotropy.extraordinary : null,
    ...parts.flatMap((part) => [part.index, part.voigt]),
  ];
  const sum = tables.reduce(
    (points, table) => points + (table && 'wavelengthsNm' in table ? table.wavelengthsNm.length : 0),
    0,
  );
  return LEAST_POINTS + sum;
}
