import { isDeepStrictEqual } from 'node:util';
import type { Transaction } from 'sequelize';
import type { LibraryEntry } from '../../shared/material.ts';
import type { Models } from '../models/models.ts';
import { withSeedLock } from './seedLock.ts';

/**
 * Brings the shipped library into the database. Constants that changed become a new version; a version that is
 * there is never touched, because stored runs rest on it. A second time changes nothing.
 *
 * @param entries what loadLibrary read from data/library
 */
export async function seedLibrary(models: Models, entries: LibraryEntry[]): Promise<void> {
  await withSeedLock(models.sequelize, () =>
    models.sequelize.transaction(async (transaction) => {
      for (const entry of entries) await seedEntry(models, entry, transaction);
    }),
  );
}

async function seedEntry(models: Models, entry: LibraryEntry, transaction: Transaction): Promise<void> {
  const { id, name, formula, preferred, notes, content } = entry;
  const naming = { name, formula, class: entry.class, preferred, notes };
  const material = await models.Material.findByPk(id, { transaction });
  if (!material) {
    await models.Material.create({ id, groupId: null, ...naming, version: 1 }, { transaction });
    await models.MaterialVersion.create({ materialId: id, version: 1, content }, { transaction });
    return;
  }
  if (material.groupId !== null) {
    throw new Error(`The shipped material ${id} cannot be seeded: a group has one with the same id.`);
  }
  const newest = await models.MaterialVersion.findOne({
    where: { materialId: id, version: material.version },
    transaction,
  });
  if (newest && isDeepStrictEqual(newest.content, content)) {
    await material.update(naming, { transaction });
    return;
  }
  const version = material.version + 1;
  await models.MaterialVersion.create({ materialId: id, version, content }, { transaction });
  await material.update({ ...naming, version }, { transaction });
}
