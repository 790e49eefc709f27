import { createHash, randomBytes } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import { UniqueConstraintError } from 'sequelize';
import type { z } from 'zod';
import type { MaterialContent } from '../../shared/material.ts';
import type {
  createMaterialSchema,
  createMaterialVersionSchema,
  renameMaterialSchema,
} from '../../shared/materialEdit.ts';
import type { Dependencies } from '../dependencies.ts';
import { conflict, invalid, notFound } from '../errors.ts';
import type { Material } from '../models/material.ts';
import type { MaterialVersion } from '../models/materialVersion.ts';
import type { Models } from '../models/models.ts';
import { isRowId } from '../routing/pathParams.ts';
import { checkMaterialContent, contentOfDraft } from './materialDraft.ts';
import { materialUses } from './materialUses.ts';
import { recordActivity } from './recordActivity.ts';

type Person = { userId: string; name: string };
type MaterialDependencies = Pick<Dependencies, 'models' | 'materials' | 'pool'>;
type NewMaterial = z.output<typeof createMaterialSchema>;
type NewVersion = z.output<typeof createMaterialVersionSchema>;

/**
 * Puts a new material into the group, as its version 1.
 *
 * @param idempotencyKey sent again, it gives the material of the first time
 * @throws Refusal 422 with every issue of the content, 409 for an import that is not ready
 */
export async function createMaterial(
  dependencies: MaterialDependencies,
  actor: Person,
  groupId: string,
  wanted: NewMaterial,
  idempotencyKey: string | null,
): Promise<Material> {
  const { models } = dependencies;
  const content = await contentOfNew(dependencies, groupId, wanted);
  const { name, formula, class: materialClass, notes } = wanted;
  const id = idFor(name, idempotencyKey === null ? null : [actor.userId, groupId, idempotencyKey]);
  const naming = { name, formula, class: materialClass, notes, preferred: false };
  try {
    return await models.sequelize.transaction(async (transaction) => {
      const material = await models.Material.create({ id, groupId, ...naming, version: 1 }, { transaction });
      await models.MaterialVersion.create(
        { materialId: id, version: 1, content, authorId: actor.userId, authorName: actor.name },
        { transaction },
      );
      await recordActivity(
        models,
        { action: 'material.create', groupId, actor, subjectId: id, detail: { name } },
        transaction,
      );
      return material;
    });
  } catch (error) {
    if (idempotencyKey === null || !(error instanceof UniqueConstraintError)) throw error;
  }
  const first = await models.Material.findByPk(id);
  if (first?.groupId !== groupId) throw notFound('material');
  const stored = await dependencies.materials.contentOf(id, 1);
  if (first.name !== name || !isDeepStrictEqual(stored, content)) {
    throw conflict('This Idempotency-Key was used for another material: send a new one.');
  }
  return first;
}

async function contentOfNew(
  dependencies: MaterialDependencies,
  groupId: string,
  { content, exportedBy }: NewMaterial,
): Promise<MaterialContent> {
  if (content) return contentOfDraft(dependencies, groupId, content, null);
  const row =
    exportedBy !== undefined && isRowId(exportedBy)
      ? await dependencies.models.MaterialImport.findOne({ where: { id: exportedBy, groupId } })
      : null;
  if (!row?.exported) {
    throw invalid([
      { path: 'exportedBy', message: 'must be an import of this group whose file Skewlight exported' },
    ]);
  }
  await checkMaterialContent(dependencies, row.exported.content, 'exportedBy.');
  return row.exported.content;
}

/** Readable, and never that of a shipped material: those have no such ending. */
function idFor(name: string, key: string[] | null): string {
  const slug = name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 40);
  const ending = key ? createHash('sha256').update(key.join('\n')).digest() : randomBytes(8);
  return `${slug || 'material'}-${ending.toString('hex').slice(0, 10)}`;
}

/**
 * Adds a version with other constants. Constants that are those of the newest version make none: the same save sent twice
 * is one save.
 *
 * @throws Refusal 409 when somebody made a version meanwhile, 422 with every issue of the content
 */
export async function createMaterialVersion(
  dependencies: MaterialDependencies,
  actor: Person,
  { id: materialId, groupId }: Material,
  { version: startedFrom, note, content: draft }: NewVersion,
): Promise<Material> {
  const { models, materials } = dependencies;
  if (groupId === null) throw notFound('material');
  const former = await materials.contentOf(materialId, startedFrom);
  const content = await contentOfDraft(dependencies, groupId, draft, former);
  return models.sequelize.transaction(async (transaction) => {
    const material = await models.Material.findByPk(materialId, {
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    if (!material) throw notFound('material');
    const newest = await models.MaterialVersion.findOne({
      where: { materialId, version: material.version },
      transaction,
    });
    if (!newest) throw new Error(`Material ${materialId} has no version ${material.version}`);
    if (isDeepStrictEqual(newest.content, content)) return material;
    if (startedFrom !== material.version) throw staleVersion(newest, startedFrom);
    const version = material.version + 1;
    await models.MaterialVersion.create(
      { materialId, version, content, note, authorId: actor.userId, authorName: actor.name },
      { transaction },
    );
    const detail = { name: material.name, version };
    await recordActivity(
      models,
      { action: 'material.version', groupId, actor, subjectId: materialId, detail },
      transaction,
    );
    return material.update({ version }, { transaction });
  });
}

function staleVersion({ version, authorName, createdAt }: MaterialVersion, startedFrom: number) {
  const message = `version ${version} was made by ${authorName ?? 'the program'} at ${createdAt.toISOString()}`;
  return conflict(
    `This edit started from version ${startedFrom}, but ${message}. Load it, then make the change again.`,
    [{ path: 'version', message: `${message}; yours is ${startedFrom}` }],
  );
}

/** Changes what a material is called; its versions stay, and stored runs keep the name that they were made with. */
export async function renameMaterial(
  models: Models,
  actor: Person,
  material: Material,
  naming: z.output<typeof renameMaterialSchema>,
): Promise<Material> {
  const former = material.name;
  return models.sequelize.transaction(async (transaction) => {
    await material.update(naming, { transaction });
    const { id: subjectId, groupId, name } = material;
    await recordActivity(
      models,
      { action: 'material.rename', groupId, actor, subjectId, detail: { name, former } },
      transaction,
    );
    return material;
  });
}

/** @throws Refusal 409 that names every stack, run, design and material that uses it */
export async function deleteMaterial(models: Models, actor: Person, material: Material): Promise<void> {
  const { id, groupId, name } = material;
  await models.sequelize.transaction(async (transaction) => {
    await models.Material.findByPk(id, { lock: transaction.LOCK.UPDATE, transaction });
    const uses = await materialUses(models, material, groupId === null ? [] : [groupId], transaction);
    const issues = (['stacks', 'runs', 'designs', 'materials'] as const).flatMap((kind) =>
      uses[kind].map((use, position) => ({
        path: `${kind}[${position}]`,
        message: `the ${kind.slice(0, -1)} "${use.name}" uses version ${use.versions.join(', ')}`,
      })),
    );
    if (issues.length > 0) {
      throw conflict(`"${name}" is in use and stays until nothing uses it: take it out there first.`, issues);
    }
    await material.destroy({ transaction });
    await recordActivity(
      models,
      { action: 'material.delete', groupId, actor, subjectId: id, detail: { name } },
      transaction,
    );
  });
}
