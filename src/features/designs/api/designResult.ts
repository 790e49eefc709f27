import { queryOptions } from '@tanstack/react-query';
import { designResultSchema } from '../../../../shared/design.ts';
import { request } from '../../../lib/apiClient.ts';

/**
 * The answer to a design. It never changes, so it is fetched once.
 *
 * @param path of the design (`/designs/…`) or of the link that opens it (`/shared/…`)
 */
export function designResultQuery(path: string) {
  return queryOptions({
    queryKey: ['design result', path],
    queryFn: ({ signal }) => request({ path: `${path}/result`, schema: designResultSchema, signal }),
    staleTime: Infinity,
  });
}

/** How often the path of a search is drawn anew, ms. */
const PARTIAL_MS = 1000;

/** What a search has found so far. */
export function partialDesignResultQuery(path: string) {
  return queryOptions({
    queryKey: ['design result so far', path],
    queryFn: ({ signal }) =>
      request({ path: `${path}/result?partial=true`, schema: designResultSchema, signal }),
    refetchInterval: PARTIAL_MS,
    gcTime: 0,
    // Another machine may be computing it, or nothing is found yet; then there is only the progress to show.
    retry: false,
  });
}
