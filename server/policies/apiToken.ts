import type { Actor } from './actor.ts';
import type { Policy } from './policy.ts';
import { signedInWithSession } from './policy.ts';

type ApiTokenSubject = { userId: string };

/** One's own only; nobody learns that another person's token exists. */
export const revokeApiToken: Policy<Actor, ApiTokenSubject> = {
  ...signedInWithSession,
  decide: (actor, token) => (token.userId === actor.userId ? 'allow' : 'hide'),
};
