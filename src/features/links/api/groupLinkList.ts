import { queryOptions } from '@tanstack/react-query';
import { linkListSchema } from '../../../../shared/link.ts';
import { request } from '../../../lib/apiClient.ts';

/** Every share link of a group; owners only. */
export function groupLinkListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'links'],
    queryFn: ({ signal }) => request({ path: `/groups/${groupId}/links`, schema: linkListSchema, signal }),
    staleTime: 0,
  });
}
