import { queryOptions } from '@tanstack/react-query';
import { materialVersionListSchema } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';

/** Every version of a material with who made it and why, newest first. */
export function materialVersionsQuery(materialId: string) {
  return queryOptions({
    queryKey: ['materials', materialId, 'versions'],
    queryFn: ({ signal }) =>
      request({
        path: `/materials/${encodeURIComponent(materialId)}/versions`,
        schema: materialVersionListSchema,
        signal,
      }),
  });
}
