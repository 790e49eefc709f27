import { queryOptions } from '@tanstack/react-query';
import { solveResponseSchema } from '../../../../shared/solve.ts';
import type { LibrarySolveRequest } from '../../../../shared/solve.ts';
import { request } from '../../../lib/apiClient.ts';

/** A film taken apart by the numeric core. The same question has the same answer for as long as it is kept. */
export function explainQuery(body: LibrarySolveRequest) {
  return queryOptions({
    queryKey: ['explain', body],
    queryFn: ({ signal }) =>
      request({ method: 'POST', path: '/solve', body, schema: solveResponseSchema, signal }),
    staleTime: Infinity,
    gcTime: 30_000,
  });
}
