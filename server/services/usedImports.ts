import { QueryTypes } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { Models } from '../models/models.ts';

type Use = { importId: string; name: string; version: number };

/**
 * The versions of materials that rest on these imports. What another group's material says of its origin does not count:
 * anybody can write an id into a file.
 *
 * @returns by import id, in alphabetical order of the materials
 */
export async function usedImports(
  models: Models,
  importIds: string[],
  transaction: Transaction,
): Promise<Map<string, Use[]>> {
  if (importIds.length === 0) return new Map();
  const of = (constant: string) => `
    SELECT i.id AS "importId", m.name, v.version
    FROM material_imports i
    JOIN material_versions v ON v.content #>> '{origin,${constant},importId}' = i.id::text
    JOIN materials m ON m.id = v.material_id AND m.group_id = i.group_id
    WHERE i.id IN (:importIds)`;
  const uses = await models.sequelize.query<Use>(`${of('index')} UNION ${of('voigt')} ORDER BY 2, 3`, {
    replacements: { importIds },
    type: QueryTypes.SELECT,
    transaction,
  });
  const byImport = new Map<string, Use[]>();
  for (const use of uses) byImport.set(use.importId, [...(byImport.get(use.importId) ?? []), use]);
  return byImport;
}
