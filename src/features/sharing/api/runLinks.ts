import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { createdLinkSchema, linkListSchema } from '../../../../shared/link.ts';
import type { CreateLink } from '../../../../shared/link.ts';
import { noContent, request } from '../../../lib/apiClient.ts';

/** The share links of one run; editors only. */
export function runLinksQuery(runId: string) {
  return queryOptions({
    queryKey: ['runs', runId, 'links'],
    queryFn: ({ signal }) => request({ path: `/runs/${runId}/links`, schema: linkListSchema, signal }),
    // "Last used" changes without us.
    staleTime: 0,
  });
}

/** Only the answer to this holds the address. */
export function useCreateLink(runId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateLink) =>
      request({ method: 'POST', path: `/runs/${runId}/links`, body, schema: createdLinkSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: runLinksQuery(runId).queryKey }),
  });
}

export function useRevokeLink(runId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) =>
      request({ method: 'DELETE', path: `/links/${linkId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: runLinksQuery(runId).queryKey }),
  });
}
