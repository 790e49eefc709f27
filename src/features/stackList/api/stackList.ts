import { queryOptions } from '@tanstack/react-query';
import { stackListSchema } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

export function stackListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'stacks'],
    queryFn: ({ signal }) => request({ path: `/groups/${groupId}/stacks`, schema: stackListSchema, signal }),
    // Stacks are saved on their own pages; coming back here must show it.
    staleTime: 0,
  });
}
