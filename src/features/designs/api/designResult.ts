import { keepPreviousData, queryOptions } from '@tanstack/react-query';
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

/** How often a stopped search is asked again for what it had found: another machine may not have stored it yet. */
const KEPT_RETRIES = 4;

/**
 * What a search has found so far, or what it had found when it was stopped.
 *
 * @param running asks again and again
 */
export function partialDesignResultQuery(path: string, running: boolean) {
  return queryOptions({
    queryKey: ['design result so far', path, running],
    queryFn: ({ signal }) =>
      request({ path: `${path}/result?partial=true`, schema: designResultSchema, signal }),
    refetchInterval: running ? PARTIAL_MS : false,
    staleTime: running ? 0 : Infinity,
    gcTime: 0,
    // What was last seen stays in sight while what was kept is fetched.
    placeholderData: keepPreviousData,
    // Another machine may be computing it, or nothing is found yet; then there is only the progress to show.
    retry: running ? false : KEPT_RETRIES,
    retryDelay: PARTIAL_MS,
  });
}
