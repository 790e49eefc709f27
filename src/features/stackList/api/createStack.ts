import { useMutation, useQueryClient } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import type { CreateStack } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';
import { stackListQuery } from './stackList.ts';

export function useCreateStack(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateStack) =>
      request({ method: 'POST', path: `/groups/${groupId}/stacks`, body, schema: stackSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: stackListQuery(groupId).queryKey }),
  });
}
