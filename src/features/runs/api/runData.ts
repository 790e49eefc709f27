import { queryOptions } from '@tanstack/react-query';
import { decodeResult } from '../../../../shared/resultFormat.ts';
import { requestBinary } from '../../../lib/apiClient.ts';

/**
 * The stored numbers of a run. They never change, so they are fetched once.
 *
 * @param path of the run (`/runs/…`) or of the link that opens it (`/shared/…`)
 */
export function runDataQuery(path: string) {
  return queryOptions({
    queryKey: ['run data', path],
    queryFn: async ({ signal }) => decodeResult(await requestBinary({ path: `${path}/data`, signal })),
    staleTime: Infinity,
    // A million points are some tens of megabytes: not kept for long after the page is left.
    gcTime: 60_000,
  });
}

/** How often a map that is being computed is drawn anew, ms. */
const PARTIAL_MS = 700;

/** What there is so far of a run that is being computed; NaN where nothing is computed yet. */
export function partialRunDataQuery(path: string) {
  return queryOptions({
    queryKey: ['run data so far', path],
    queryFn: async ({ signal }) =>
      decodeResult(await requestBinary({ path: `${path}/data?partial=true`, signal })),
    refetchInterval: PARTIAL_MS,
    gcTime: 0,
    // Another machine may be computing it; then there is only the progress to show.
    retry: false,
  });
}
