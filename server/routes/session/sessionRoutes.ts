import { sessionSchema, signInSchema } from '../../../shared/account.ts';
import { clearSessionCookie, setSessionCookie } from '../../auth/sessionCookie.ts';
import { anyone, signedIn } from '../../policies/policy.ts';
import { presentSession } from '../../presenters/presentSession.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { loadMemberships, signIn } from '../../services/accounts.ts';

const createSession = route({
  method: 'post',
  path: '/session',
  summary: 'Sign in with e-mail address and password; sets the session cookie.',
  policy: anyone,
  body: signInSchema,
  answer: { status: 200, schema: sessionSchema },
  async handler({ dependencies, body, response }) {
    const user = await signIn(dependencies, body);
    setSessionCookie(response, user, dependencies.config);
    return presentSession(user, await loadMemberships(dependencies.models, user.id));
  },
});

const readSession = route({
  method: 'get',
  path: '/session',
  summary: 'Who is signed in, and the groups they work in.',
  noun: 'account',
  policy: signedIn,
  load: ({ dependencies, actor }) => dependencies.models.User.findByPk(actor.userId),
  answer: { status: 200, schema: sessionSchema },
  handler: async ({ dependencies, subject }) =>
    presentSession(subject, await loadMemberships(dependencies.models, subject.id)),
});

const deleteSession = route({
  method: 'delete',
  path: '/session',
  summary: 'Sign out of this browser.',
  policy: signedIn,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, response }) => clearSessionCookie(response, dependencies.config),
});

export const sessionRoutes: Route[] = [createSession, readSession, deleteSession];
