import type { Role } from '../../shared/account.ts';

/** Who asks, as known from the session cookie or the API token of the request. */
export type Actor = {
  userId: string;
  name: string;
  email: string;
  isSiteAdministrator: boolean;
  via: 'session' | 'token';
  /** Role by group id; a group that is not in it is none of theirs. */
  roles: ReadonlyMap<string, Role>;
};

const rank: Record<Role, number> = { viewer: 1, editor: 2, owner: 3 };

/** A member of any role. */
export function isMember(actor: Pick<Actor, 'roles'>, groupId: string): boolean {
  return actor.roles.has(groupId);
}

/** Holds at least this role: an owner may do what an editor may. */
export function holdsRole(actor: Pick<Actor, 'roles'>, groupId: string, least: Role): boolean {
  const role = actor.roles.get(groupId);
  return role !== undefined && rank[role] >= rank[least];
}
