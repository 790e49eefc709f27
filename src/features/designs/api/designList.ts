import { queryOptions } from '@tanstack/react-query';
import { designListSchema } from '../../../../shared/design.ts';
import { request } from '../../../lib/apiClient.ts';
import { isOver } from '../../../lib/useProgressEvents.ts';

const activeEveryMs = 1500;

/** The designs of a group, newest first; asked again and again while one of them is under way. */
export function designListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'designs'],
    queryFn: ({ signal }) =>
      request({ path: `/groups/${groupId}/designs`, schema: designListSchema, signal }),
    staleTime: 0,
    refetchInterval: (query) =>
      query.state.data?.designs.some(({ progress }) => !isOver(progress.state)) ? activeEveryMs : false,
  });
}
