import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { memberListQuery } from './memberList.ts';

export function useRemoveMember(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (userId: string) =>
      request({ method: 'DELETE', path: `/groups/${groupId}/members/${userId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: memberListQuery(groupId).queryKey }),
  });
}
