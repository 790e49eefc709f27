import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { stackListQuery } from './stackList.ts';

export function useDeleteStack(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (stackId: string) =>
      request({ method: 'DELETE', path: `/stacks/${stackId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: stackListQuery(groupId).queryKey }),
  });
}
