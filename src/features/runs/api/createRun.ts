import { useMutation, useQueryClient } from '@tanstack/react-query';
import { errorEnvelopeSchema } from '../../../../shared/error.ts';
import { runSchema } from '../../../../shared/run.ts';
import type { CreateRun, Run } from '../../../../shared/run.ts';
import { ApiError } from '../../../lib/apiClient.ts';
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

/** Not through the API client, which has no place for the header of the key. Rejects with ApiError as that does. */
async function createRun({ body, key }: { body: CreateRun; key: string }): Promise<Run> {
  const response = await fetch('/api/v1/runs', {
    method: 'POST',
    credentials: 'same-origin',
    headers: { accept: 'application/json', 'content-type': 'application/json', 'idempotency-key': key },
    body: JSON.stringify(body),
  }).catch(() => null);
  if (response === null) {
    throw new ApiError(0, 'network', 'The server cannot be reached. Check the connection, then try again.');
  }
  const received: unknown = await response.json().catch(() => null);
  const run = runSchema.safeParse(received);
  if (response.ok && run.success) return run.data;
  const envelope = errorEnvelopeSchema.safeParse(received);
  if (!envelope.success) {
    throw new ApiError(
      response.status,
      'unreadable',
      'The server did not say what became of the run. Try again.',
    );
  }
  const { code, message, issues, requestId } = envelope.data.error;
  throw new ApiError(response.status, code, message, issues, requestId ?? null);
}
