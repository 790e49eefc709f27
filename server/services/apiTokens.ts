import type { ApiToken } from '../models/apiToken.ts';
import type { Models } from '../models/models.ts';
import type { Actor } from '../policies/actor.ts';
import { recordActivity } from './recordActivity.ts';
import { hashSecret, makeSecret } from './secrets.ts';

/** @returns the row, and the secret that is shown this once */
export async function createApiToken(
  models: Models,
  actor: Actor,
  name: string,
): Promise<{ token: ApiToken; secret: string }> {
  const secret = makeSecret('skw_');
  const token = await models.sequelize.transaction(async (transaction) => {
    const created = await models.ApiToken.create(
      { userId: actor.userId, name, tokenHash: hashSecret(secret), lastUsedAt: null },
      { transaction },
    );
    await recordActivity(
      models,
      { action: 'token.create', groupId: null, actor, subjectId: created.id, detail: { name } },
      transaction,
    );
    return created;
  });
  return { token, secret };
}

export async function revokeApiToken(models: Models, actor: Actor, token: ApiToken): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    await token.destroy({ transaction });
    await recordActivity(
      models,
      { action: 'token.revoke', groupId: null, actor, subjectId: token.id, detail: { name: token.name } },
      transaction,
    );
  });
}
