import type { Session } from '../../shared/account.ts';
import type { Membership } from '../models/membership.ts';
import type { User } from '../models/user.ts';

/** @param memberships with their groups; the personal group comes first, the rest by name */
export function presentSession(user: User, memberships: Membership[]): Session {
  return {
    user: {
      id: user.id,
      name: user.name,
      email: user.email,
      isSiteAdministrator: user.isSiteAdministrator,
    },
    groups: memberships.flatMap(presentMembership).sort(personalFirst),
  };
}

function presentMembership({ group, role }: Membership): Session['groups'] {
  if (!group) return [];
  const { id, name, isPersonal, isDemo } = group;
  return [{ groupId: id, groupName: name, role, isPersonal, isDemo }];
}

type PresentedMembership = Session['groups'][number];

function personalFirst(a: PresentedMembership, b: PresentedMembership): number {
  return Number(b.isPersonal) - Number(a.isPersonal) || a.groupName.localeCompare(b.groupName);
}
