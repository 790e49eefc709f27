import { queryOptions, skipToken } from '@tanstack/react-query';
import { solveResponseSchema } from '../../../../shared/solve.ts';
import type { LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import { request } from '../../../lib/apiClient.ts';
import type { Sweep } from '../model/solveStates.ts';

type Solved = { response: SolveResponse; seconds: number };

async function solve(body: LibrarySolveRequest, signal: AbortSignal): Promise<Solved> {
  const start = performance.now();
  const response = await request({
    method: 'POST',
    path: '/solve',
    body,
    schema: solveResponseSchema,
    signal,
  });
  return { response, seconds: (performance.now() - start) / 1000 };
}

// The same film at the same point has the same readings: an answer stays good for as long as it is kept.
const kept = { staleTime: Infinity, gcTime: 30_000 };

/** One request to the numeric core. A request that is no longer wanted is aborted by the query itself. */
export function solveQuery(body: LibrarySolveRequest) {
  return queryOptions({
    queryKey: ['solve', body],
    queryFn: ({ signal }) => solve(body, signal),
    ...kept,
  });
}

/** A whole sweep, null for none. The answer keeps the sweep it is of, since an older one stays on screen meanwhile. */
export function sweepQuery(asked: { sweep: Sweep; request: LibrarySolveRequest } | null) {
  return queryOptions({
    queryKey: ['sweep', asked],
    queryFn: asked
      ? async ({ signal }) => ({ ...(await solve(asked.request, signal)), sweep: asked.sweep })
      : skipToken,
    ...kept,
  });
}
