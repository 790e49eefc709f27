import { Op } from 'sequelize';
import type { MaterialContent } from '../../shared/material.ts';
import type { Dependencies } from '../dependencies.ts';
import type { Material } from '../models/material.ts';

/** One version of a material that a group can use: its own or a shipped one; null when there is none. */
export async function findMaterial(
  { models, materials }: Pick<Dependencies, 'models' | 'materials'>,
  groupId: string,
  { material: id, version }: { material: string; version: number },
): Promise<{ material: Material; content: MaterialContent } | null> {
  const material = await models.Material.findOne({ where: { id, groupId: { [Op.or]: [null, groupId] } } });
  const content = material && (await materials.contentOf(id, version));
  return content ? { material, content } : null;
}
