import { queryOptions } from '@tanstack/react-query';
import { studyListSchema } from '../../../../shared/study.ts';
import { request } from '../../../lib/apiClient.ts';

/** The studies of a group, the one saved last first. */
export function studyListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'studies'],
    queryFn: ({ signal }) => request({ path: `/groups/${groupId}/studies`, schema: studyListSchema, signal }),
    // Studies are saved on their own pages; coming back here must show it.
    staleTime: 0,
  });
}
