import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { importPreviewSchema } from '../../../../shared/materialImport.ts';
import type { ImportMapping } from '../../../../shared/materialImport.ts';
import { request } from '../../../lib/apiClient.ts';

/** The constants that a mapping makes of an import; nothing is stored. */
export function importPreviewQuery(importId: string, mapping: ImportMapping | null) {
  return queryOptions({
    queryKey: ['imports', importId, 'preview', mapping],
    queryFn: ({ signal }) =>
      request({
        method: 'POST',
        path: `/imports/${encodeURIComponent(importId)}/preview`,
        body: mapping,
        schema: importPreviewSchema,
        signal,
      }),
    enabled: mapping !== null,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
  });
}
