import { queryOptions } from '@tanstack/react-query';
import { stackSchema } from '../../../../shared/stack.ts';
import { request } from '../../../lib/apiClient.ts';

export function stackQuery(stackId: string) {
  return queryOptions({
    queryKey: ['stacks', stackId],
    queryFn: ({ signal }) => request({ path: `/stacks/${stackId}`, schema: stackSchema, signal }),
  });
}
