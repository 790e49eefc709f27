import { queryOptions } from '@tanstack/react-query';
import { sessionSchema } from '../../../../shared/account.ts';
import type { Session } from '../../../../shared/account.ts';
import { ApiError, request } from '../../../lib/apiClient.ts';

/** Who is signed in, or null. Not being signed in is an answer here, not an error. */
async function fetchSession(signal: AbortSignal): Promise<Session | null> {
  try {
    return await request({ path: '/session', schema: sessionSchema, signal });
  } catch (error) {
    if (error instanceof ApiError && error.status === 401) return null;
    throw error;
  }
}

export function sessionQuery() {
  return queryOptions({
    queryKey: ['session'],
    queryFn: ({ signal }) => fetchSession(signal),
    staleTime: 60_000,
  });
}
