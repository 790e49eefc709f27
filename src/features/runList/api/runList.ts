import { queryOptions } from '@tanstack/react-query';
import { runListSchema } from '../../../../shared/run.ts';
import type { RunState } from '../../../../shared/run.ts';
import { request } from '../../../lib/apiClient.ts';

const activeEveryMs = 1500;

/** Whether a run may still change by itself. */
function isActive(state: RunState): boolean {
  return state === 'queued' || state === 'running';
}

/** The runs of a group, newest first; asked again and again while one of them is under way. */
export function runListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'runs'],
    queryFn: ({ signal }) => request({ path: `/groups/${groupId}/runs`, schema: runListSchema, signal }),
    staleTime: 0,
    refetchInterval: (query) =>
      query.state.data?.runs.some((run) => isActive(run.progress.state)) ? activeEveryMs : false,
  });
}
