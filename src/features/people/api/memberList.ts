import { queryOptions } from '@tanstack/react-query';
import { memberListSchema } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';

export function memberListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'members'],
    queryFn: ({ signal }) =>
      request({ path: `/groups/${groupId}/members`, schema: memberListSchema, signal }),
  });
}
