import { queryOptions } from '@tanstack/react-query';
import { sharedDesignSchema } from '../../../../shared/design.ts';
import { sharedGrowthCardSchema } from '../../../../shared/growthCard.ts';
import { sharedSubjectSchema } from '../../../../shared/link.ts';
import { sharedStudySchema } from '../../../../shared/study.ts';
import { request } from '../../../lib/apiClient.ts';
import { sharedPath } from './sharedRun.ts';

/** What a share link opens, before it is opened. Whatever it is stays as it is while the page is read. */
export function sharedSubjectQuery(token: string) {
  return queryOptions({
    queryKey: ['shared', token, 'subject'],
    queryFn: ({ signal }) =>
      request({ path: `${sharedPath(token)}/subject`, schema: sharedSubjectSchema, signal }),
    staleTime: Infinity,
  });
}

export function sharedDesignQuery(token: string) {
  return queryOptions({
    queryKey: ['shared', token, 'design'],
    queryFn: ({ signal }) =>
      request({ path: `${sharedPath(token)}/design`, schema: sharedDesignSchema, signal }),
    staleTime: Infinity,
  });
}

export function sharedStudyQuery(token: string) {
  return queryOptions({
    queryKey: ['shared', token, 'study'],
    queryFn: ({ signal }) =>
      request({ path: `${sharedPath(token)}/study`, schema: sharedStudySchema, signal }),
    staleTime: Infinity,
  });
}

export function sharedCardQuery(token: string) {
  return queryOptions({
    queryKey: ['shared', token, 'card'],
    queryFn: ({ signal }) =>
      request({ path: `${sharedPath(token)}/card`, schema: sharedGrowthCardSchema, signal }),
    staleTime: Infinity,
  });
}
