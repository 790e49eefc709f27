import type { Actor } from './actor.ts';
import { isMember } from './actor.ts';
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
