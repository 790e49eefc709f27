import type { Actor } from './actor.ts';
import { holdsRole, isMember } from './actor.ts';
import type { Policy } from './policy.ts';
import { requireActor } from './policy.ts';

type MaterialSubject = { groupId: string | null };

/** The shipped library belongs to no group and is everybody's to read. */
export const readMaterial: Policy<Actor, MaterialSubject> = {
  who: 'member of the group; the shipped library: signed in',
  authentication: 'session or token',
  admit: requireActor,
  decide: (actor, { groupId }) => (groupId === null || isMember(actor, groupId) ? 'allow' : 'hide'),
};

/** The shipped library changes only with the program. */
export const changeMaterial: Policy<Actor, MaterialSubject> = {
  who: 'editor of the group; the shipped library: nobody',
  authentication: 'session or token',
  admit: requireActor,
  decide(actor, { groupId }) {
    if (groupId === null) return 'refuse';
    if (!isMember(actor, groupId)) return 'hide';
    return holdsRole(actor, groupId, 'editor') ? 'allow' : 'refuse';
  },
  remedy: ({ groupId }) =>
    groupId === null ? 'Copy the material into your group and change the copy.' : null,
};
