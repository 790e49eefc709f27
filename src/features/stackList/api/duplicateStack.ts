import { useMutation, useQueryClient } from '@tanstack/react-query';
import { LIMITS } from '../../../../shared/limits.ts';
import { stackSchema } from '../../../../shared/stack.ts';
import type { StackSummary } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';
import { stackDocumentQuery } from './stackDocument.ts';
import { stackListQuery } from './stackList.ts';

/** "Film", "Film (copy)", cut so that the name stays within what the server takes. */
function nameOfCopy(name: string): string {
  const ending = ' (copy)';
  return name.slice(0, LIMITS.nameLength - ending.length) + ending;
}

export function useDuplicateStack(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (stack: StackSummary) => {
      const document = await client.fetchQuery(stackDocumentQuery(stack));
      const body = { name: nameOfCopy(stack.name), description: stack.description, document };
      return request({ method: 'POST', path: `/groups/${groupId}/stacks`, body, schema: stackSchema });
    },
    onSuccess: () => client.invalidateQueries({ queryKey: stackListQuery(groupId).queryKey }),
  });
}
