import { UniqueConstraintError } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { Role } from '../../shared/account.ts';
import { conflict, notFound } from '../errors.ts';
import type { Membership } from '../models/membership.ts';
import type { Models } from '../models/models.ts';
import type { User } from '../models/user.ts';
import type { Actor } from '../policies/actor.ts';
import { normalizeEmail } from './accounts.ts';
import { recordActivity } from './recordActivity.ts';

/**
 * Takes an existing account into the group.
 *
 * @throws Refusal 404 when nobody has the address, 409 when they are a member already
 */
export async function addMember(
  models: Models,
  actor: Actor,
  groupId: string,
  { email, role }: { email: string; role: Role },
): Promise<{ membership: Membership; user: User }> {
  const user = await models.User.findOne({ where: { email: normalizeEmail(email) } });
  if (!user) {
    const message = 'nobody has an account with this address: ask them to sign up first';
    throw notFound('account', [{ path: 'email', message }]);
  }
  try {
    const membership = await models.sequelize.transaction(async (transaction) => {
      const created = await models.Membership.create({ userId: user.id, groupId, role }, { transaction });
      const detail = { name: user.name, role };
      await recordActivity(
        models,
        { action: 'member.add', groupId, actor, subjectId: user.id, detail },
        transaction,
      );
      return created;
    });
    return { membership, user };
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    throw conflict(`${user.name} is a member already.`, [{ path: 'email', message: 'is a member already' }]);
  }
}

/** @throws Refusal 404 when they are no member any more, 409 when the group would lose its last owner */
export async function changeRole(
  models: Models,
  actor: Actor,
  { groupId, userId }: { groupId: string; userId: string },
  role: Role,
): Promise<{ membership: Membership; user: User }> {
  return models.sequelize.transaction(async (transaction) => {
    const { membership, user } = await lockMember(models, groupId, userId, role !== 'owner', transaction);
    const from = membership.role;
    await membership.update({ role }, { transaction });
    const detail = { name: user.name, from, to: role };
    await recordActivity(
      models,
      { action: 'member.change-role', groupId, actor, subjectId: userId, detail },
      transaction,
    );
    return { membership, user };
  });
}

/** @throws Refusal 404 when they are no member any more, 409 when the group would lose its last owner */
export async function removeMember(
  models: Models,
  actor: Actor,
  { groupId, userId }: { groupId: string; userId: string },
): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    const { membership, user } = await lockMember(models, groupId, userId, true, transaction);
    await membership.destroy({ transaction });
    const detail = { name: user.name, role: membership.role };
    await recordActivity(
      models,
      { action: 'member.remove', groupId, actor, subjectId: userId, detail },
      transaction,
    );
  });
}

/**
 * The membership, with all of the group's locked: two owners who step down at the same moment are seen one after
 * the other.
 */
async function lockMember(
  models: Models,
  groupId: string,
  userId: string,
  ownershipEnds: boolean,
  transaction: Transaction,
): Promise<{ membership: Membership; user: User }> {
  const all = await models.Membership.findAll({
    where: { groupId },
    order: ['userId'],
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  const membership = all.find((one) => one.userId === userId);
  const user = membership && (await models.User.findByPk(userId, { transaction }));
  if (!membership || !user) throw notFound('member');
  const otherOwners = all.filter((one) => one.role === 'owner' && one.userId !== userId);
  if (ownershipEnds && membership.role === 'owner' && otherOwners.length === 0) {
    throw conflict(`${user.name} is the last owner: make another member an owner first.`);
  }
  return { membership, user };
}
