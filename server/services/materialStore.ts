import { Op } from 'sequelize';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { Material } from '../models/material.ts';
import type { Models } from '../models/models.ts';
import { namedMaterials } from './namedMaterials.ts';

/** Contents kept in memory; a version never changes, so none goes stale. */
const KEPT_CONTENTS = 500;

export type MaterialStore = {
  /** The constants of one version; null when there is no such version. */
  contentOf(materialId: string, version: number): Promise<MaterialContent | null>;
  /**
   * The library media of these cases by `${id}@${version}`, as resolveCase takes them: the version that a medium
   * names, or the newest. What is not in reach is left out, and resolveCase says so with its place.
   *
   * @param groupIds groups whose materials are in reach, beside the shipped library
   */
  loadFor(
    cases: LibrarySolveCase[],
    groupIds: Iterable<string>,
  ): Promise<Map<string, ResolvableMaterial & { material: Material }>>;
};

export function createMaterialStore(models: Models): MaterialStore {
  const contents = new Map<string, MaterialContent>();

  async function contentOf(materialId: string, version: number): Promise<MaterialContent | null> {
    const key = `${materialId}@${version}`;
    const known = contents.get(key);
    if (known) return known;
    const row = await models.MaterialVersion.findOne({ where: { materialId, version } });
    if (!row) return null;
    const [oldest] = contents.keys();
    if (contents.size >= KEPT_CONTENTS && oldest !== undefined) contents.delete(oldest);
    contents.set(key, row.content);
    return row.content;
  }

  return {
    contentOf,
    async loadFor(cases, groupIds) {
      const wanted = versionsByMaterial(cases);
      const found = new Map<string, ResolvableMaterial & { material: Material }>();
      if (wanted.size === 0) return found;
      const materials = await models.Material.findAll({
        where: { id: [...wanted.keys()], groupId: { [Op.or]: [null, ...groupIds] } },
      });
      for (const material of materials) {
        for (const version of wanted.get(material.id) ?? []) {
          const actual = version === 'newest' ? material.version : version;
          const content = await contentOf(material.id, actual);
          if (!content) continue;
          const { id, name } = material;
          found.set(`${id}@${actual}`, { id, version: actual, name, content, material });
        }
      }
      return found;
    },
  };
}

function versionsByMaterial(cases: LibrarySolveCase[]): Map<string, Set<number | 'newest'>> {
  const wanted = new Map<string, Set<number | 'newest'>>();
  for (const { material, version } of cases.flatMap(namedMaterials)) {
    const versions = wanted.get(material) ?? new Set();
    wanted.set(material, versions.add(version ?? 'newest'));
  }
  return wanted;
}
