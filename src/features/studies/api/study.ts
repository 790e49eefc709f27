import { queryOptions } from '@tanstack/react-query';
import { studySchema, studyVersionListSchema } from '../../../../shared/study.ts';
import { request } from '../../../lib/apiClient.ts';

export function studyQuery(studyId: string) {
  return queryOptions({
    queryKey: ['studies', studyId],
    queryFn: ({ signal }) => request({ path: `/studies/${studyId}`, schema: studySchema, signal }),
    // A colleague may have saved: the newest is asked for whenever the page is opened.
    staleTime: 0,
  });
}

/**
 * Its versions, newest first.
 *
 * @param version the newest that is known, so that a save asks anew
 */
export function studyVersionsQuery(studyId: string, version: number) {
  return queryOptions({
    queryKey: ['studies', studyId, 'versions', version],
    queryFn: ({ signal }) =>
      request({ path: `/studies/${studyId}/versions`, schema: studyVersionListSchema, signal }),
  });
}
