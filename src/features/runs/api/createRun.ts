import { useMutation, useQueryClient } from '@tanstack/react-query';
import { runSchema } from '../../../../shared/run.ts';
import type { CreateRun, Run } from '../../../../shared/run.ts';
import { request } from '../../../lib/apiClient.ts';
import { runQuery } from './run.ts';

/**
 * Makes a run. The key names the press of the button: the same key sent twice (a double click, a repeated request)
 * makes one run.
 */
export function useCreateRun() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: createRun,
    onSuccess: (run) => {
      client.setQueryData(runQuery(run.id).queryKey, run);
      void client.invalidateQueries({ queryKey: ['groups', run.groupId] });
    },
  });
}

function createRun({ body, key }: { body: CreateRun; key: string }): Promise<Run> {
  return request({
    method: 'POST',
    path: '/runs',
    body,
    headers: { 'idempotency-key': key },
    schema: runSchema,
  });
}
