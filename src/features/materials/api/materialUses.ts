import { queryOptions } from '@tanstack/react-query';
import { materialUsesSchema } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';

/** Stacks, runs and materials that a material is used in, as far as the asker may see them. */
export function materialUsesQuery(materialId: string) {
  return queryOptions({
    queryKey: ['materials', materialId, 'uses'],
    queryFn: ({ signal }) =>
      request({
        path: `/materials/${encodeURIComponent(materialId)}/uses`,
        schema: materialUsesSchema,
        signal,
      }),
    // Stacks and runs change on other pages; coming back here must show it.
    staleTime: 0,
  });
}
