import { queryOptions } from '@tanstack/react-query';
import { runSchema } from '../../../../shared/run.ts';
import { request } from '../../../lib/apiClient.ts';

export function runQuery(runId: string) {
  return queryOptions({
    queryKey: ['runs', runId],
    queryFn: ({ signal }) => request({ path: `/runs/${runId}`, schema: runSchema, signal }),
  });
}
