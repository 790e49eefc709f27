import type { Actor } from './actor.ts';
import { holdsRole, isMember } from './actor.ts';
import type { Policy } from './policy.ts';
import { groupRole, requireActor } from './policy.ts';

type MemberSubject = { groupId: string; userId: string };

export const changeMember = groupRole<MemberSubject>('owner', (member) => member.groupId);

/** An owner removes anybody; a member may leave. */
export const removeMember: Policy<Actor, MemberSubject> = {
  who: 'owner of the group, or the member themself',
  authentication: 'session or token',
  admit: requireActor,
  decide(actor, member) {
    if (!isMember(actor, member.groupId)) return 'hide';
    return actor.userId === member.userId || holdsRole(actor, member.groupId, 'owner') ? 'allow' : 'refuse';
  },
};
