import { createdTokenSchema, createTokenSchema, tokenListSchema } from '../../../shared/account.ts';
import { revokeApiToken as mayRevoke } from '../../policies/apiToken.ts';
import { signedInWithSession } from '../../policies/policy.ts';
import { presentApiToken } from '../../presenters/presentApiToken.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { createApiToken, revokeApiToken } from '../../services/apiTokens.ts';

const listTokens = route({
  method: 'get',
  path: '/tokens',
  summary: 'Your API tokens, newest first.',
  policy: signedInWithSession,
  answer: { status: 200, schema: tokenListSchema },
  async handler({ dependencies, actor }) {
    const tokens = await dependencies.models.ApiToken.findAll({
      where: { userId: actor.userId },
      order: [['createdAt', 'DESC']],
    });
    return { tokens: tokens.map(presentApiToken) };
  },
});

const createToken = route({
  method: 'post',
  path: '/tokens',
  summary: 'Make an API token. It is in this answer and cannot be shown again.',
  policy: signedInWithSession,
  body: createTokenSchema,
  answer: { status: 201, schema: createdTokenSchema },
  async handler({ dependencies, actor, body }) {
    const { token, secret } = await createApiToken(dependencies.models, actor, body.name);
    return { ...presentApiToken(token), token: secret };
  },
});

const deleteToken = route({
  method: 'delete',
  path: '/tokens/:tokenId',
  summary: 'Revoke an API token; it stops to work at once.',
  noun: 'token',
  policy: mayRevoke,
  load: ({ dependencies, params }) => dependencies.models.ApiToken.findByPk(params.tokenId),
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => revokeApiToken(dependencies.models, actor, subject),
});

export const tokenRoutes: Route[] = [listTokens, createToken, deleteToken];
