import { UniqueConstraintError } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { SignIn, SignUp } from '../../shared/account.ts';
import { mayActAsUser } from '../auth/loadActor.ts';
import { hashPassword, verifyPassword } from '../auth/passwords.ts';
import type { Dependencies } from '../dependencies.ts';
import { conflict, unauthenticated } from '../errors.ts';
import type { Membership } from '../models/membership.ts';
import type { Models } from '../models/models.ts';
import type { User } from '../models/user.ts';
import { recordActivity } from './recordActivity.ts';

/** One address is one account, however it is typed. */
export const normalizeEmail = (email: string) => email.trim().toLowerCase();

/**
 * Makes an account and its personal group.
 *
 * @throws Refusal 409 when the address has an account
 */
export async function signUp(models: Models, { name, email, password }: SignUp): Promise<User> {
  const passwordHash = await hashPassword(password);
  try {
    return await models.sequelize.transaction(async (transaction) => {
      const user = await models.User.create(
        { name, email: normalizeEmail(email), passwordHash },
        { transaction },
      );
      const groupId = await createPersonalGroup(models, user, transaction);
      const actor = { userId: user.id, name };
      await recordActivity(
        models,
        { action: 'account.create', groupId, actor, subjectId: user.id },
        transaction,
      );
      return user;
    });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    const message = 'has an account already: sign in, or reset the password';
    throw conflict(`This e-mail address ${message}.`, [{ path: 'email', message }]);
  }
}

async function createPersonalGroup(models: Models, user: User, transaction: Transaction): Promise<string> {
  const group = await models.Group.create(
    { name: `${user.name} (personal)`, isPersonal: true },
    { transaction },
  );
  await models.Membership.create({ userId: user.id, groupId: group.id, role: 'owner' }, { transaction });
  return group.id;
}

/**
 * Checks address and password. The refusal is the same, and as slow, whether the address or the password is wrong.
 *
 * @throws Refusal 401
 */
export async function signIn(
  { models, config }: Pick<Dependencies, 'models' | 'config'>,
  { email, password }: SignIn,
): Promise<User> {
  const found = await models.User.findOne({ where: { email: normalizeEmail(email) } });
  const user = found && mayActAsUser(found, config) ? found : null;
  const matches = await verifyPassword(user?.passwordHash ?? null, password);
  if (!user || !matches) throw unauthenticated('E-mail address and password do not match an account.');
  return user;
}

/** The person's memberships with their groups. */
export function loadMemberships(models: Models, userId: string): Promise<Membership[]> {
  return models.Membership.findAll({ where: { userId }, include: 'group' });
}
