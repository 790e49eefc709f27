import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { groupLinkListQuery } from './groupLinkList.ts';

export function useRevokeGroupLink(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) =>
      request({ method: 'DELETE', path: `/links/${linkId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: groupLinkListQuery(groupId).queryKey }),
  });
}
