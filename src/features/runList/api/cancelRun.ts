import { useMutation, useQueryClient } from '@tanstack/react-query';
import { runProgressSchema } from '../../../../shared/run.ts';
import { request } from '../../../lib/apiClient.ts';
import { runListQuery } from './runList.ts';

export function useCancelRun(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (runId: string) =>
      request({ method: 'POST', path: `/runs/${runId}/cancel`, schema: runProgressSchema }),
    onSettled: () => client.invalidateQueries({ queryKey: runListQuery(groupId).queryKey }),
  });
}
