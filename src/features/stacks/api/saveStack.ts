import { useMutation, useQueryClient } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import type { UpdateStack } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';
import { stackQuery } from './stack.ts';

/** Saves a new version over the one named in the body; 409 when that is no longer the newest. */
export function useSaveStack(stackId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: UpdateStack) =>
      request({ method: 'PATCH', path: `/stacks/${stackId}`, body, schema: stackSchema }),
    onSuccess: (stack) => {
      client.setQueryData(stackQuery(stackId).queryKey, stack);
      void client.invalidateQueries({ queryKey: ['groups', stack.groupId] });
    },
  });
}
