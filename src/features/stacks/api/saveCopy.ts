import { useMutation, useQueryClient } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import type { CreateStack } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

/** Puts the edits into a stack of their own and leaves the one they began with as it is. */
export function useSaveCopy(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateStack) =>
      request({ method: 'POST', path: `/groups/${groupId}/stacks`, body, schema: stackSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['groups', groupId] }),
  });
}
