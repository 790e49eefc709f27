import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { createdLinkSchema, linkListSchema } from '../../../../shared/link.ts';
import type { CreateLink, Link } from '../../../../shared/link.ts';
import { noContent, request } from '../../../lib/apiClient.ts';

/** What the links of one panel open. A growth card makes its link when it is made. */
export type LinkSubject = { opens: Exclude<Link['opens'], 'card'>; id: string };

const nouns = { run: 'runs', design: 'designs', study: 'studies' } as const;

/** The share links of one run, design or study; editors only. */
export function linksQuery({ opens, id }: LinkSubject) {
  return queryOptions({
    queryKey: [nouns[opens], id, 'links'],
    queryFn: ({ signal }) =>
      request({ path: `/${nouns[opens]}/${id}/links`, schema: linkListSchema, signal }),
    // "Last used" changes without us.
    staleTime: 0,
  });
}

/** Only the answer to this holds the address. */
export function useCreateLink(subject: LinkSubject) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateLink) =>
      request({
        method: 'POST',
        path: `/${nouns[subject.opens]}/${subject.id}/links`,
        body,
        schema: createdLinkSchema,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: linksQuery(subject).queryKey }),
  });
}

export function useRevokeLink(subject: LinkSubject) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) =>
      request({ method: 'DELETE', path: `/links/${linkId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: linksQuery(subject).queryKey }),
  });
}
