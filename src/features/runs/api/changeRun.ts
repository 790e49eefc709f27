import { useMutation, useQueryClient } from '@tanstack/react-query';
import { runProgressSchema, runSchema } from '../../../../shared/run.ts';
import type { Run } from '../../../../shared/run.ts';
import { noContent, request } from '../../../lib/apiClient.ts';
import { runQuery } from './run.ts';

export function useCancelRun(run: Run) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'POST', path: `/runs/${run.id}/cancel`, schema: runProgressSchema }),
    onSettled: () => client.invalidateQueries({ queryKey: runQuery(run.id).queryKey }),
  });
}

/** The same input with today's solver, as a run of its own. */
export function useRerun(run: Run) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'POST', path: `/runs/${run.id}/rerun`, schema: runSchema }),
    onSuccess: (made) => {
      client.setQueryData(runQuery(made.id).queryKey, made);
      void client.invalidateQueries({ queryKey: ['groups', made.groupId] });
    },
  });
}

export function useDeleteRun(run: Run) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: `/runs/${run.id}`, schema: noContent }),
    onSuccess: () => {
      client.removeQueries({ queryKey: runQuery(run.id).queryKey });
      void client.invalidateQueries({ queryKey: ['groups', run.groupId] });
    },
  });
}
