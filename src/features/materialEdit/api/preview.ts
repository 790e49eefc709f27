import { queryOptions, skipToken } from '@tanstack/react-query';
import { materialCurvesSchema } from '../../../../shared/material.ts';
import type { MaterialDraft } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';

/** Curves of constants that are not kept; null asks nothing. A request no longer wanted is aborted by the query. */
export function previewQuery(groupId: string, content: MaterialDraft | null) {
  return queryOptions({
    queryKey: ['materialPreview', groupId, content],
    queryFn: content
      ? ({ signal }) =>
          request({
            method: 'POST',
            path: `/groups/${groupId}/materials/preview`,
            body: { content },
            schema: materialCurvesSchema,
            signal,
          })
      : skipToken,
    staleTime: Infinity,
    gcTime: 30_000,
  });
}
