import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { runListQuery } from './runList.ts';

export function useDeleteRun(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (runId: string) => request({ method: 'DELETE', path: `/runs/${runId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: runListQuery(groupId).queryKey }),
  });
}
