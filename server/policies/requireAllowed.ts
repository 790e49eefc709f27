import { forbidden, notFound } from '../errors.ts';
import type { Decision } from './policy.ts';

type Decider<Who, Subject> = {
  who: string;
  decide: (who: Who, subject: Subject) => Decision;
  remedy?: (subject: Subject) => string | null;
};

/**
 * Holds what a policy decides against the one who asks.
 *
 * @param noun what the subject is called in the refusal
 * @throws Refusal 404 when the subject is hidden from them, 403 when their role does not reach
 */
export function requireAllowed<Who, Subject>(
  policy: Decider<Who, Subject>,
  who: Who,
  subject: Subject,
  noun: string,
): void {
  const decision = policy.decide(who, subject);
  if (decision === 'hide') throw notFound(noun);
  if (decision === 'refuse') {
    const remedy = policy.remedy?.(subject) ?? 'Ask an owner of the group.';
    throw forbidden(`This needs the right of: ${policy.who}. ${remedy}`);
  }
}
