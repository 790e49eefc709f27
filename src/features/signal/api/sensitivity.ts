import { queryOptions } from '@tanstack/react-query';
import { sensitivityAnswerSchema } from '../../../../shared/toleranceDesign.ts';
import type { SensitivityRequest } from '../../../../shared/toleranceDesign.ts';
import { request } from '../../../lib/apiClient.ts';

/** What each reading hangs on. The same film has the same derivatives for as long as they are kept. */
export function sensitivityQuery(body: SensitivityRequest) {
  return queryOptions({
    queryKey: ['sensitivity', body],
    queryFn: ({ signal }) =>
      request({ method: 'POST', path: '/sensitivity', body, schema: sensitivityAnswerSchema, signal }),
    staleTime: Infinity,
    gcTime: 30_000,
  });
}
