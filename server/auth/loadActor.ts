import type { Config } from '../config.ts';
import type { Models } from '../models/models.ts';
import type { User } from '../models/user.ts';
import type { Actor } from '../policies/actor.ts';

/** Demo accounts have a published password: nothing of them holds in production. */
export function mayActAsUser(user: Pick<User, 'isDemo'>, config: Pick<Config, 'production'>): boolean {
  return !(user.isDemo && config.production);
}

/**
 * The person behind a session or token, with the roles of this moment: a change of role holds from the next request.
 *
 * @param sessionVersion the generation in the cookie; null for an API token, which outlives a password reset
 */
export async function loadActor(
  { models, config }: { models: Models; config: Pick<Config, 'production'> },
  userId: string,
  via: Actor['via'],
  sessionVersion: number | null,
): Promise<Actor | null> {
  // One query: this stands before every answer.
  const user = await models.User.findByPk(userId, { include: 'memberships' });
  if (!user || !mayActAsUser(user, config)) return null;
  if (sessionVersion !== null && sessionVersion !== user.sessionVersion) return null;
  return {
    userId: user.id,
    name: user.name,
    email: user.email,
    isSiteAdministrator: user.isSiteAdministrator,
    via,
    roles: new Map(user.memberships?.map((membership) => [membership.groupId, membership.role])),
  };
}
