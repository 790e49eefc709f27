import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { studySchema } from '../../../../shared/study.ts';
import type { CreateStudy, Study, UpdateStudy } from '../../../../shared/study.ts';
import { noContent, request } from '../../../lib/apiClient.ts';
import { studyQuery } from './study.ts';

export function postStudy(groupId: string, body: CreateStudy): Promise<Study> {
  return request({ method: 'POST', path: `/groups/${groupId}/studies`, body, schema: studySchema });
}

export function patchStudy(studyId: string, body: UpdateStudy): Promise<Study> {
  return request({ method: 'PATCH', path: `/studies/${studyId}`, body, schema: studySchema });
}

export function keepStudy(client: QueryClient, study: Study): void {
  client.setQueryData(studyQuery(study.id).queryKey, study);
  void client.invalidateQueries({ queryKey: ['groups', study.groupId] });
}

export function useCreateStudy(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateStudy) => postStudy(groupId, body),
    onSuccess: (study) => keepStudy(client, study),
  });
}

/** Saves a new version over the one named in the body; 409 when that is no longer the newest. */
export function useSaveStudy(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: UpdateStudy) => patchStudy(studyId, body),
    onSuccess: (study) => keepStudy(client, study),
  });
}

export function useDeleteStudy({ id, groupId }: Study) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: `/studies/${id}`, schema: noContent }),
    onSuccess: () => {
      client.removeQueries({ queryKey: studyQuery(id).queryKey });
      void client.invalidateQueries({ queryKey: ['groups', groupId] });
    },
  });
}
