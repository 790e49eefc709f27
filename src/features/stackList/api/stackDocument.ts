import { queryOptions } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

/** The document behind a row, for its small drawing and for copies. A version never changes, so it stays fresh. */
export function stackDocumentQuery(stack: { id: string; version: number }) {
  return queryOptions({
    queryKey: ['stackList', 'document', stack.id, stack.version],
    queryFn: async ({ signal }) =>
      (await request({ path: `/stacks/${stack.id}`, schema: stackSchema, signal })).document,
    staleTime: Infinity,
  });
}
