import { queryOptions } from '@tanstack/react-query';
import { designSchema } from '../../../../shared/design.ts';
import { request } from '../../../lib/apiClient.ts';

export function designQuery(designId: string) {
  return queryOptions({
    queryKey: ['designs', designId],
    queryFn: ({ signal }) => request({ path: `/designs/${designId}`, schema: designSchema, signal }),
  });
}
