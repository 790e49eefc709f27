import { requestPasswordResetSchema, resetPasswordSchema } from '../../../shared/account.ts';
import { anyone } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { completePasswordReset, requestPasswordReset } from '../../services/passwordResets.ts';

const createPasswordReset = route({
  method: 'post',
  path: '/password-resets',
  summary:
    'Ask for a reset link by e-mail. The answer is the same whether the address has an account or not.',
  policy: anyone,
  body: requestPasswordResetSchema,
  answer: { status: 202, schema: null },
  handler({ dependencies, body, log }) {
    // Not awaited: how long it takes would tell whether the address has an account.
    requestPasswordReset(dependencies, body.email).catch((error: unknown) => {
      log.error({ err: error }, 'A password reset could not be mailed');
    });
  },
});

const finishPasswordReset = route({
  method: 'post',
  path: '/password-resets/complete',
  summary: 'Set a new password with the token of a reset mail; ends every session of the account.',
  policy: anyone,
  body: resetPasswordSchema,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, body }) => completePasswordReset(dependencies, body.token, body.password),
});

export const passwordResetRoutes: Route[] = [createPasswordReset, finishPasswordReset];
