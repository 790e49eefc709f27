import type { Role } from '../../shared/account.ts';
import { forbidden, unauthenticated } from '../errors.ts';
import type { Actor } from './actor.ts';
import { holdsRole, isMember } from './actor.ts';

/**
 * `hide` answers 404, so that somebody outside a group cannot tell whether an id exists; `refuse` answers 403 to a
 * member whose role does not reach.
 */
export type Decision = 'allow' | 'hide' | 'refuse';

/** Who may call a route, decided in two steps: by who asks, then by what was loaded. */
export type Policy<Who extends Actor | null, Subject> = {
  /** Such as "editor of the group"; printed in the OpenAPI description and held against the route table in a test. */
  who: string;
  authentication: 'none' | 'session or token' | 'session';
  /** @throws Refusal 401 or 403 */
  admit: (actor: Actor | null) => Who;
  decide: (who: Who, subject: Subject) => Decision;
  /** What to do instead, where asking an owner would not help. */
  remedy?: (subject: Subject) => string | null;
};

/** A policy that looks at roles alone, so that it can be asked again later with those of then. */
type RolePolicy<Subject> = Omit<Policy<Actor, Subject>, 'decide'> & {
  decide: (who: Pick<Actor, 'roles'>, subject: Subject) => Decision;
};

/** No account needed. The actor is not looked up, so that a share link costs no more than it must. */
export const anyone: Policy<null, unknown> = {
  who: 'anyone',
  authentication: 'none',
  admit: () => null,
  decide: () => 'allow',
};

export const signedIn: Policy<Actor, unknown> = {
  who: 'signed in',
  authentication: 'session or token',
  admit: requireActor,
  decide: () => 'allow',
};

/** For what a script's token must not do, such as making further tokens. */
export const signedInWithSession: Policy<Actor, unknown> = {
  who: 'signed in (cookie only)',
  authentication: 'session',
  admit(actor) {
    const known = requireActor(actor);
    if (known.via !== 'session') throw forbidden('An API token cannot do this: sign in with the browser.');
    return known;
  },
  decide: () => 'allow',
};

/**
 * At least this role in the group that the subject belongs to.
 *
 * @param groupIdOf the group of what was loaded
 */
export function groupRole<Subject>(
  least: Role,
  groupIdOf: (subject: Subject) => string,
): RolePolicy<Subject> {
  return {
    who: least === 'viewer' ? 'member of the group' : `${least} of the group`,
    authentication: 'session or token',
    admit: requireActor,
    decide(actor, subject) {
      const groupId = groupIdOf(subject);
      if (!isMember(actor, groupId)) return 'hide';
      return holdsRole(actor, groupId, least) ? 'allow' : 'refuse';
    },
  };
}

export function requireActor(actor: Actor | null): Actor {
  if (!actor) throw unauthenticated();
  return actor;
}
