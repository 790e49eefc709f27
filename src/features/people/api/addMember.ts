import { useMutation, useQueryClient } from '@tanstack/react-query';
import { memberSchema } from '../../../../shared/account.ts';
import type { Role } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { memberListQuery } from './memberList.ts';

export function useAddMember(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { email: string; role: Role }) =>
      request({ method: 'POST', path: `/groups/${groupId}/members`, body, schema: memberSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: memberListQuery(groupId).queryKey }),
  });
}
