import { useMutation, useQueryClient } from '@tanstack/react-query';
import { memberSchema } from '../../../../shared/account.ts';
import type { Role } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { memberListQuery } from './memberList.ts';

export function useChangeRole(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId, role }: { userId: string; role: Role }) =>
      request({
        method: 'PATCH',
        path: `/groups/${groupId}/members/${userId}`,
        body: { role },
        schema: memberSchema,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: memberListQuery(groupId).queryKey }),
  });
}
