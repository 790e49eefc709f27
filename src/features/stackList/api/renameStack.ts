import { useMutation, useQueryClient } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import type { StackSummary } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';
import { stackListQuery } from './stackList.ts';

/** The version goes along, so that a rename over somebody's newer save is refused and not lost. */
export function useRenameStack(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ stack, name }: { stack: StackSummary; name: string }) =>
      request({
        method: 'PATCH',
        path: `/stacks/${stack.id}`,
        body: { version: stack.version, name },
        schema: stackSchema,
      }),
    onSettled: () => client.invalidateQueries({ queryKey: stackListQuery(groupId).queryKey }),
  });
}
