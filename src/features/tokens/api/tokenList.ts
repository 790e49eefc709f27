import { queryOptions } from '@tanstack/react-query';
import { tokenListSchema } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';

export function tokenListQuery() {
  return queryOptions({
    queryKey: ['tokens'],
    queryFn: ({ signal }) => request({ path: '/tokens', schema: tokenListSchema, signal }),
  });
}
