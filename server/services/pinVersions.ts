import { Op } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { StackDocument } from '../../shared/stack.ts';
import type { Models } from '../models/models.ts';
import { mapNamedMaterials, namedMaterialsOf } from './runMedia.ts';

/**
 * The document as it is stored: a material without a version is pinned to the one that is the newest now, so that a
 * later one changes no stack until somebody takes it. A material that the group cannot reach stays as it is; solving
 * says so at its place.
 */
export async function pinVersions(
  models: Models,
  groupId: string,
  document: StackDocument,
  transaction: Transaction,
): Promise<StackDocument> {
  const unnamed = namedMaterialsOf(document).filter(({ version }) => version === undefined);
  if (unnamed.length === 0) return document;
  const materials = await models.Material.findAll({
    where: { id: unnamed.map(({ material }) => material), groupId: { [Op.or]: [null, groupId] } },
    transaction,
  });
  const newest = new Map(materials.map(({ id, version }) => [id, version]));
  return mapNamedMaterials(document, (named) => {
    const version = named.version ?? newest.get(named.material);
    return version === undefined ? named : { ...named, version };
  });
}
