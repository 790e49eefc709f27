import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { AppDependencies } from '../dependencies.ts';
import { conflict, tooManyRequests } from '../errors.ts';
import type { Group } from '../models/group.ts';
import type { MaterialImport } from '../models/materialImport.ts';
import type { Models } from '../models/models.ts';
import { recordActivity } from './recordActivity.ts';
import { usedImports } from './usedImports.ts';

type Person = { userId: string; name: string };
type GivenFile = { fileName: string; bytes: Buffer };

/** Files of one group that are being read at a time; each holds a thread of the pool. */
const MOST_READING = 4;
/** Bytes of files that one group may keep. */
const MOST_BYTES = 1_000_000_000;

/**
 * Stores a file and begins to read it. The same file sent again, by the same person and under the same name, is the
 * import of the first time as long as that is there.
 *
 * @throws Refusal 429 while the group has too many being read, 409 when it keeps too much
 */
export async function createImport(
  { models, jobs }: Pick<AppDependencies, 'models' | 'jobs'>,
  actor: Person,
  group: Group,
  { fileName, bytes }: GivenFile,
): Promise<MaterialImport> {
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const same = { groupId: group.id, createdById: actor.userId, sha256, fileName };
  const { row, isNew } = await models.sequelize.transaction(async (transaction) => {
    // Requests of one group one after the other, so that two of the same file cannot both be the first.
    await models.Group.findByPk(group.id, { lock: transaction.LOCK.UPDATE, transaction });
    const first = await models.MaterialImport.findOne({
      where: { ...same, state: ['reading', 'ready'] },
      transaction,
    });
    if (first) return { row: first, isNew: false };
    await refuseTooMuch(models, group.id, bytes.length, transaction);
    const made = await models.MaterialImport.create({ ...same, bytes, size: bytes.length }, { transaction });
    await recordActivity(
      models,
      { action: 'import.create', groupId: group.id, actor, subjectId: made.id, detail: { fileName } },
      transaction,
    );
    return { row: made, isNew: true };
  });
  if (isNew) jobs.imports.begin(row.id, 0);
  return row;
}

async function refuseTooMuch(
  models: Models,
  groupId: string,
  bytes: number,
  transaction: Transaction,
): Promise<void> {
  const reading = await models.MaterialImport.count({ where: { groupId, state: 'reading' }, transaction });
  if (reading >= MOST_READING) {
    throw tooManyRequests(`${reading} files of this group are being read. Wait until one is done.`);
  }
  const kept = await models.MaterialImport.sum('size', { where: { groupId, state: 'ready' }, transaction });
  if ((kept ?? 0) + bytes > MOST_BYTES) {
    throw conflict(
      `The files of this group would take more than ${MOST_BYTES / 1e9} GB. Discard imports and delete materials that nobody needs.`,
    );
  }
}

/** @throws Refusal 409 when a version of a material rests on it */
export async function deleteImport(models: Models, actor: Person, row: MaterialImport): Promise<void> {
  const { id, groupId, fileName } = row;
  await models.sequelize.transaction(async (transaction) => {
    await models.MaterialImport.findByPk(id, { lock: transaction.LOCK.UPDATE, transaction });
    const uses = (await usedImports(models, [id], transaction)).get(id) ?? [];
    if (uses.length > 0) {
      throw conflict(
        'Materials rest on this file: it stays as long as they do.',
        uses.map(({ name, version }, position) => ({
          path: `materials[${position}]`,
          message: `version ${version} of "${name}" rests on it`,
        })),
      );
    }
    await row.destroy({ transaction });
    await recordActivity(
      models,
      { action: 'import.delete', groupId, actor, subjectId: id, detail: { fileName } },
      transaction,
    );
  });
}

/** @throws Refusal 409 when it was refused: then nothing of it was kept */
export async function readImportBytes(models: Models, row: MaterialImport): Promise<Buffer> {
  const full = await models.MaterialImport.scope('withBytes').findByPk(row.id);
  if (!full?.bytes) throw conflict('This file was refused, and nothing of it was kept. Import it again.');
  return full.bytes;
}
