import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { sharedRunSchema } from '../../../../shared/run.ts';
import { stackSchema } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

export function sharedPath(token: string): string {
  return `/shared/${encodeURIComponent(token)}`;
}

/** What a share link opens. It is a run as it was: fetched once, so that a visit counts once. */
export function sharedRunQuery(token: string) {
  return queryOptions({
    queryKey: ['shared', token],
    queryFn: ({ signal }) => request({ path: sharedPath(token), schema: sharedRunSchema, signal }),
    staleTime: Infinity,
  });
}

export function useOpenInGroup(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (groupId: string) =>
      request({
        method: 'POST',
        path: `${sharedPath(token)}/stacks`,
        body: { groupId },
        schema: stackSchema,
      }),
    onSuccess: (stack) => client.invalidateQueries({ queryKey: ['groups', stack.groupId] }),
  });
}
