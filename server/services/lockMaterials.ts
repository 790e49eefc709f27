import { Op } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { Material } from '../models/material.ts';
import type { Models } from '../models/models.ts';

/**
 * The materials with these ids that the group can use, each held until the transaction ends: whoever deletes one
 * meanwhile waits, and then sees what is being stored here among its uses. New versions are made as before.
 */
export async function lockMaterials(
  models: Models,
  groupId: string,
  ids: string[],
  transaction: Transaction,
): Promise<Material[]> {
  if (ids.length === 0) return [];
  return models.Material.findAll({
    where: { id: [...new Set(ids)], groupId: { [Op.or]: [null, groupId] } },
    order: [['id', 'ASC']],
    lock: transaction.LOCK.KEY_SHARE,
    transaction,
  });
}
