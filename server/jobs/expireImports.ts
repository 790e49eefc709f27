import { Op, literal } from 'sequelize';
import type { Models } from '../models/models.ts';
import { usedImports } from '../services/usedImports.ts';

/** How long a file waits for somebody to make a material of it. */
const KEPT_DAYS = 7;
/** Files looked at in one go; the rest come at the next. */
const BATCH = 200;

/** Deletes old imports on which no version of a material rests. */
export async function expireImports(models: Models): Promise<number> {
  return models.sequelize.transaction(async (transaction) => {
    const old = await models.MaterialImport.findAll({
      attributes: ['id'],
      where: { createdAt: { [Op.lt]: literal(`now() - interval '${KEPT_DAYS} days'`) } },
      order: ['createdAt'],
      limit: BATCH,
      lock: transaction.LOCK.UPDATE,
      skipLocked: true,
      transaction,
    });
    const used = await usedImports(
      models,
      old.map(({ id }) => id),
      transaction,
    );
    const unused = old.map(({ id }) => id).filter((id) => !used.has(id));
    return models.MaterialImport.destroy({ where: { id: unused }, transaction });
  });
}
