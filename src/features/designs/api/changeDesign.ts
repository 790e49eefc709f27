import { useMutation, useQueryClient } from '@tanstack/react-query';
import { designSchema } from '../../../../shared/design.ts';
import { runProgressSchema } from '../../../../shared/run.ts';
import { noContent, request } from '../../../lib/apiClient.ts';
import { designQuery } from './design.ts';
import { designListQuery } from './designList.ts';

/** What names a design: a whole one or its line in the list. */
type Subject = { id: string; groupId: string };

export function useCancelDesign(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (designId: string) =>
      request({ method: 'POST', path: `/designs/${designId}/cancel`, schema: runProgressSchema }),
    onSettled: (_progress, _error, designId) =>
      Promise.all([
        client.invalidateQueries({ queryKey: designQuery(designId).queryKey }),
        client.invalidateQueries({ queryKey: designListQuery(groupId).queryKey }),
      ]),
  });
}

/** The same question with today's solver, as a design of its own. */
export function useRerunDesign({ id, groupId }: Subject) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'POST', path: `/designs/${id}/rerun`, schema: designSchema }),
    onSuccess: (made) => {
      client.setQueryData(designQuery(made.id).queryKey, made);
      void client.invalidateQueries({ queryKey: designListQuery(groupId).queryKey });
    },
  });
}

export function useDeleteDesign({ id, groupId }: Subject) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: `/designs/${id}`, schema: noContent }),
    onSuccess: () => {
      client.removeQueries({ queryKey: designQuery(id).queryKey });
      void client.invalidateQueries({ queryKey: designListQuery(groupId).queryKey });
    },
  });
}
