import { queryOptions } from '@tanstack/react-query';
import { healthSchema } from '../../../../shared/health.ts';
import { request } from '../../../lib/apiClient.ts';

export function healthQuery() {
  return queryOptions({
    queryKey: ['health'],
    queryFn: ({ signal }) => request({ path: '/health', schema: healthSchema, signal }),
  });
}
