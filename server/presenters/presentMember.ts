import type { Member } from '../../shared/account.ts';
import type { Membership } from '../models/membership.ts';
import type { User } from '../models/user.ts';

export function presentMember(membership: Membership, user: User): Member {
  return {
    userId: user.id,
    name: user.name,
    email: user.email,
    role: membership.role,
    joinedAt: membership.createdAt.toISOString(),
  };
}
