import { Op } from 'sequelize';
import { hashPassword } from '../auth/passwords.ts';
import { mayActAsUser } from '../auth/loadActor.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import { normalizeEmail } from './accounts.ts';
import { recordActivity } from './recordActivity.ts';
import { hashSecret, makeSecret } from './secrets.ts';

const VALID_MINUTES = 60;

type Needs = Pick<Dependencies, 'config' | 'models' | 'mailer' | 'publicUrl'>;

/**
 * Mails a reset link when the address has an account, and does nothing otherwise. Callers answer before this is
 * done, so that the time of the answer does not tell which it was.
 */
export async function requestPasswordReset(dependencies: Needs, email: string): Promise<void> {
  const { config, models, mailer, publicUrl } = dependencies;
  const user = await models.User.findOne({ where: { email: normalizeEmail(email) } });
  if (!user || !mayActAsUser(user, config)) return;
  const secret = makeSecret();
  await models.sequelize.transaction(async (transaction) => {
    const expiresAt = new Date(Date.now() + VALID_MINUTES * 60_000);
    await models.PasswordReset.create(
      { userId: user.id, tokenHash: hashSecret(secret), expiresAt },
      { transaction },
    );
    const actor = { userId: user.id, name: user.name };
    await recordActivity(
      models,
      { action: 'password.request-reset', groupId: null, actor, subjectId: user.id },
      transaction,
    );
  });
  await mailer.send({
    to: user.email,
    subject: 'Set a new password for Skewlight',
    text: mailText(publicUrl(), secret),
  });
}

function mailText(publicUrl: string, secret: string): string {
  return [
    'Somebody, probably you, asked to set a new password for your Skewlight account.',
    `Open this address within ${VALID_MINUTES} minutes:`,
    `${publicUrl}/reset-password/${secret}`,
    'If it was not you, do nothing: your password stays as it is.',
  ].join('\n\n');
}

/**
 * Sets a new password by the secret of a reset mail. It works once; every session of the account ends.
 *
 * @throws Refusal 422 when the link was used, is too old or never existed
 */
export async function completePasswordReset(
  { config, models }: Pick<Dependencies, 'config' | 'models'>,
  secret: string,
  password: string,
): Promise<void> {
  const passwordHash = await hashPassword(password);
  await models.sequelize.transaction(async (transaction) => {
    const reset = await models.PasswordReset.findOne({
      where: { tokenHash: hashSecret(secret), usedAt: null, expiresAt: { [Op.gt]: new Date() } },
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    const user = reset && (await models.User.findByPk(reset.userId, { transaction }));
    if (!user || !mayActAsUser(user, config)) {
      throw invalid([{ path: 'token', message: 'this link was used or is too old: ask for a new one' }]);
    }
    await user.update({ passwordHash, sessionVersion: user.sessionVersion + 1 }, { transaction });
    await models.PasswordReset.update(
      { usedAt: new Date() },
      { where: { userId: user.id, usedAt: null }, transaction },
    );
    const actor = { userId: user.id, name: user.name };
    await recordActivity(
      models,
      { action: 'password.reset', groupId: null, actor, subjectId: user.id },
      transaction,
    );
  });
}
