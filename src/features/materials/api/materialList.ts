import { queryOptions } from '@tanstack/react-query';
import { materialListSchema } from '../../../../shared/material.ts';
import { request } from '../../../lib/apiClient.ts';

/** The shipped library and the group's own materials. */
export function materialListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'materials'],
    queryFn: ({ signal }) =>
      request({ path: `/groups/${groupId}/materials`, schema: materialListSchema, signal }),
    staleTime: 300_000,
  });
}
