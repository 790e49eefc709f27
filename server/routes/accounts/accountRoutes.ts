import { sessionSchema, signUpSchema } from '../../../shared/account.ts';
import { setSessionCookie } from '../../auth/sessionCookie.ts';
import { anyone } from '../../policies/policy.ts';
import { presentSession } from '../../presenters/presentSession.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { loadMemberships, signUp } from '../../services/accounts.ts';

const createAccount = route({
  method: 'post',
  path: '/accounts',
  summary: 'Sign up: makes the account and its personal group, and signs in.',
  policy: anyone,
  body: signUpSchema,
  answer: { status: 201, schema: sessionSchema },
  async handler({ dependencies, body, response }) {
    const user = await signUp(dependencies.models, body);
    setSessionCookie(response, user, dependencies.config);
    return presentSession(user, await loadMemberships(dependencies.models, user.id));
  },
});

export const accountRoutes: Route[] = [createAccount];
