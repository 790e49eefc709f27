import { queryOptions } from '@tanstack/react-query';
import { caughtMailListSchema } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';

export function mailListQuery() {
  return queryOptions({
    queryKey: ['mails'],
    queryFn: ({ signal }) => request({ path: '/development/mails', schema: caughtMailListSchema, signal }),
    refetchInterval: 5000,
  });
}
