import { Op } from 'sequelize';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { Material } from '../models/material.ts';
import type { MaterialVersion } from '../models/materialVersion.ts';
import type { Models } from '../models/models.ts';
import { materialFacts } from './materialFacts.ts';
import type { MaterialFacts } from './materialFacts.ts';
import { namedMaterials } from './namedMaterials.ts';
import type { StoredVersion } from './versionCache.ts';
import { VersionCache } from './versionCache.ts';

export type LoadedMaterial = ResolvableMaterial & { material: Material };

export type MaterialStore = {
  /** Null when there is no such version. */
  versionOf(materialId: string, version: number): Promise<StoredVersion | null>;
  /** The constants of one version; null when there is no such version. */
  contentOf(materialId: string, version: number): Promise<MaterialContent | null>;
  /** What a list says of one version; null when there is no such version. */
  factsOf(materialId: string, version: number): Promise<MaterialFacts | null>;
  /**
   * The library media of these cases by `${id}@${version}`, as resolveCase takes them: the version that a medium
   * names, or the newest. What is not in reach is left out, and resolveCase says so with its place.
   *
   * @param groupIds groups whose materials are in reach, beside the shipped library
   */
  loadFor(cases: LibrarySolveCase[], groupIds: Iterable<string>): Promise<Map<string, LoadedMaterial>>;
};

export function createMaterialStore(models: Models): MaterialStore {
  const cache = new VersionCache();

  async function versionOf(materialId: string, version: number): Promise<StoredVersion | null> {
    const known = cache.find(materialId, version);
    if (known) return known;
    const row = await models.MaterialVersion.findOne({ where: { materialId, version } });
    return row && cache.keep(materialId, toStoredVersion(row));
  }

  return {
    versionOf,
    async contentOf(materialId, version) {
      return (await versionOf(materialId, version))?.content ?? null;
    },
    async factsOf(materialId, version) {
      const known = cache.facts(materialId, version);
      if (known) return known;
      const stored = await versionOf(materialId, version);
      return stored && cache.keepFacts(materialId, version, materialFacts(stored.content));
    },
    async loadFor(cases, groupIds) {
      const wanted = versionsByMaterial(cases);
      const found = new Map<string, LoadedMaterial>();
      if (wanted.size === 0) return found;
      const materials = await models.Material.findAll({
        where: { id: [...wanted.keys()], groupId: { [Op.or]: [null, ...groupIds] } },
      });
      for (const material of materials) {
        for (const version of wanted.get(material.id) ?? []) {
          const actual = version === 'newest' ? material.version : version;
          const stored = await versionOf(material.id, actual);
          if (!stored) continue;
          const { id, name } = material;
          found.set(`${id}@${actual}`, { id, version: actual, name, content: stored.content, material });
        }
      }
      return found;
    },
  };
}

function toStoredVersion({ version, content, authorName, note, createdAt }: MaterialVersion): StoredVersion {
  return { version, content, author: authorName, note, madeAt: createdAt };
}

function versionsByMaterial(cases: LibrarySolveCase[]): Map<string, Set<number | 'newest'>> {
  const wanted = new Map<string, Set<number | 'newest'>>();
  for (const { material, version } of cases.flatMap(namedMaterials)) {
    const versions = wanted.get(material) ?? new Set();
    wanted.set(material, versions.add(version ?? 'newest'));
  }
  return wanted;
}
