import type { Transaction } from 'sequelize';
import type { StackDocument } from '../../shared/stack.ts';
import type { Models } from '../models/models.ts';
import { lockMaterials } from './lockMaterials.ts';
import { mapNamedMaterials, namedMaterialsOf } from './runMedia.ts';

/**
 * The document as it is stored: a material without a version is pinned to the one that is the newest now, so that a
 * later one changes no stack until somebody takes it. A material that the group cannot reach stays as it is; solving
 * says so at its place. The materials are held until the transaction ends, so that none is deleted while the document is
 * being stored.
 */
export async function pinVersions(
  models: Models,
  groupId: string,
  document: StackDocument,
  transaction: Transaction,
): Promise<StackDocument> {
  const named = namedMaterialsOf(document).map(({ material }) => material);
  const materials = await lockMaterials(models, groupId, named, transaction);
  const newest = new Map(materials.map(({ id, version }) => [id, version]));
  return mapNamedMaterials(document, (named) => {
    const version = named.version ?? newest.get(named.material);
    return version === undefined ? named : { ...named, version };
  });
}
