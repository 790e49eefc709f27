import { queryOptions, skipToken } from '@tanstack/react-query';
import { solveResponseSchema } from '../../../../shared/solve.ts';
import type { LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import { request } from '../../../lib/apiClient.ts';
import type { Sweep } from '../model/solveStates.ts';

/** One request to the numeric core. */
export function solve(body: LibrarySolveRequest, signal: AbortSignal): Promise<SolveResponse> {
  return request({ method: 'POST', path: '/solve', body, schema: solveResponseSchema, signal });
}

/** A whole sweep, null for none. The answer keeps the sweep it is of, since an older one stays on screen meanwhile. */
export function sweepQuery(asked: { sweep: Sweep; request: LibrarySolveRequest } | null) {
  return queryOptions({
    queryKey: ['sweep', asked],
    queryFn: asked
      ? async ({ signal }) => ({ response: await solve(asked.request, signal), sweep: asked.sweep })
      : skipToken,
    // The same film has the same sweep: an answer stays good for as long as it is kept.
    staleTime: Infinity,
    gcTime: 30_000,
  });
}
