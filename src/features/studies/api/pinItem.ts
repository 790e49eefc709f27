import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Study, StudyItem } from '../../../../shared/study.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { keepStudy, patchStudy, postStudy } from './changeStudy.ts';
import { studyQuery } from './study.ts';

/** Where an item goes: to the end of a study, or into a new one. */
export type PinTarget = { studyId: string } | { title: string; question: string };

/** How often a save is tried again over somebody else's: appending is in nobody's way. */
const TRIES = 3;

/** Appends an item to a study as it is on the server at that moment. */
export function usePinItem(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async ({ target, item }: { target: PinTarget; item: StudyItem }): Promise<Study> => {
      if (!('studyId' in target)) {
        const { title, question } = target;
        return postStudy(groupId, { title, document: { question, items: [item] } });
      }
      for (let tried = 1; ; tried++) {
        const { version, document } = await client.fetchQuery(studyQuery(target.studyId));
        try {
          return await patchStudy(target.studyId, {
            version,
            document: { ...document, items: [...document.items, item] },
          });
        } catch (error) {
          if (!(error instanceof ApiError) || error.status !== 409 || tried === TRIES) throw error;
        }
      }
    },
    onSuccess: (study) => keepStudy(client, study),
  });
}
