import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import { gone } from '../errors.ts';
import type { Run } from '../models/run.ts';
import type { MaterialStore } from './materialStore.ts';

/**
 * The constants that a stored run was made with.
 *
 * @throws Refusal 410 when a version is gone, which the database only allows when the group's material was deleted
 */
export async function loadRunMaterials(
  store: MaterialStore,
  run: Pick<Run, 'input' | 'materials'>,
): Promise<ResolvableMaterial[]> {
  return Promise.all(
    run.input.materials.map(async ({ id, version }) => {
      const content = await store.contentOf(id, version);
      if (!content) throw gone(`Version ${version} of the material ${id}, which this run uses, is gone.`);
      const used = run.materials.find((material) => material.id === id && material.version === version);
      return { id, version, name: used?.name ?? id, ...(used && { formula: used.formula }), content };
    }),
  );
}
