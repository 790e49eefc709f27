import { QueryTypes } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { MaterialUses } from '../../shared/materialEdit.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { Material } from '../models/material.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { namedMaterialsOf } from './runMedia.ts';

type Found<Detail> = { id: string; name: string } & Detail;

/**
 * Where a material is used: stacks by their newest document, runs and designs by what they were made from, materials by the parts
 * of their newest mixture. Versions are those of this material.
 *
 * @param groupIds groups that are looked into
 */
export async function materialUses(
  models: Models,
  { id, version: newest }: Material,
  groupIds: string[],
  transaction?: Transaction,
): Promise<MaterialUses> {
  if (groupIds.length === 0) return { stacks: [], runs: [], designs: [], materials: [] };
  const ask = <Row extends object>(sql: string) =>
    models.sequelize.query<Row>(sql, {
      replacements: { id, groupIds, part: JSON.stringify([{ id }]), named: JSON.stringify({ id }) },
      type: QueryTypes.SELECT,
      ...(transaction && { transaction }),
    });
  const stacks = await ask<Found<{ document: StackDocument }>>(`
    SELECT s.id, s.name, v.document FROM stacks s
    JOIN stack_versions v ON v.stack_id = s.id AND v.version = s.version
    WHERE s.group_id IN (:groupIds)
      AND jsonb_path_exists(v.document, '$.**.material ? (@ == $id)', CAST(:named AS jsonb))
    ORDER BY s.name, s.id`);
  const computed = await ask<Found<{ kind: Run['kind']; materials: { id: string; version: number }[] }>>(`
    SELECT id, name, kind, materials FROM runs
    WHERE group_id IN (:groupIds) AND materials @> CAST(:part AS jsonb)
    ORDER BY created_at DESC, id`);
  const mixtures = await ask<Found<{ parts: { material: string; version: number }[] }>>(`
    SELECT m.id, m.name, v.content #> '{index,parts}' AS parts FROM materials m
    JOIN material_versions v ON v.material_id = m.id AND v.version = m.version
    WHERE m.group_id IN (:groupIds)
      AND jsonb_path_exists(v.content, '$.index.parts[*].material ? (@ == $id)', CAST(:named AS jsonb))
    ORDER BY m.name, m.id`);
  const versions = (named: { material: string; version?: number }[]) =>
    rising(named.flatMap((one) => (one.material === id ? [one.version ?? newest] : [])));
  const toRunUse = (one: (typeof computed)[number]) =>
    toUse(one, versions(one.materials.map((used) => ({ material: used.id, version: used.version }))));
  return {
    stacks: stacks.map((one) => toUse(one, versions(namedMaterialsOf(one.document)))),
    runs: computed.filter(({ kind }) => kind === 'sweep').map(toRunUse),
    designs: computed.filter(({ kind }) => kind !== 'sweep').map(toRunUse),
    materials: mixtures.map((one) => toUse(one, versions(one.parts))),
  };
}

function toUse({ id, name }: { id: string; name: string }, versions: number[]) {
  return { id, name, versions };
}

function rising(versions: number[]): number[] {
  return [...new Set(versions)].sort((a, b) => a - b);
}
