import { queryOptions } from '@tanstack/react-query';
import { materialSchema } from '../../../../shared/material.ts';
import { request } from '../../../lib/apiClient.ts';

/** One material in one version, whole; the newest when `version` is null. */
export function materialVersionQuery(materialId: string, version: number | null) {
  const search = version === null ? '' : `?version=${version}`;
  return queryOptions({
    queryKey: ['materials', materialId, version],
    queryFn: ({ signal }) =>
      request({
        path: `/materials/${encodeURIComponent(materialId)}${search}`,
        schema: materialSchema,
        signal,
      }),
    staleTime: 300_000,
  });
}
