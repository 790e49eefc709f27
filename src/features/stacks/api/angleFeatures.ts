import { queryOptions } from '@tanstack/react-query';
import { angleFeaturesSchema } from '../../../../shared/live.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

/** Angles at which something happens for this film at its working point; nothing is asked without a film. */
export function angleFeaturesQuery(document: StackDocument | null) {
  return queryOptions({
    queryKey: ['angle features', document],
    queryFn: ({ signal }) =>
      request({
        method: 'POST',
        path: '/angle-features',
        body: { document },
        schema: angleFeaturesSchema,
        signal,
      }),
    enabled: document !== null,
    staleTime: Infinity,
    gcTime: 30_000,
  });
}
