import type { ApiToken as PresentedApiToken } from '../../shared/account.ts';
import type { ApiToken } from '../models/apiToken.ts';

export function presentApiToken(token: ApiToken): PresentedApiToken {
  return {
    id: token.id,
    name: token.name,
    createdAt: token.createdAt.toISOString(),
    lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
  };
}
