import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { Material } from '../../../../shared/material.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { previewQuery } from '../api/preview.ts';
import { fieldPath, readContent } from '../model/draftOfForm.ts';
import type { ContentForm } from '../model/form.ts';

/** A pause in typing after which the curves are asked for. */
const PAUSE_MS = 300;

export type Preview = {
  /** The last curves there were; null before the first. */
  curves: Material['curves'] | null;
  /** Whether they are of an earlier state of the form than the one on the page. */
  pending: boolean;
  /** What is wrong with the constants as they stand now; paths as the form names its fields. */
  issues: readonly Issue[];
  /** A failure that is no fault of the constants. */
  error: Error | null;
};

/** The curves of the constants in the form, anew as they change. Answers to an earlier state are dropped. */
export function usePreview(groupId: string, form: ContentForm): Preview {
  const { draft, issues } = useMemo(() => readContent(form, { sourcesLater: true }), [form]);
  const settled = useSettled(draft, PAUSE_MS);
  const query = useQuery({
    ...previewQuery(groupId, settled),
    placeholderData: keepPreviousData,
    retry: false,
  });
  const refused = settled === draft ? query.error : null;
  const found = useMemo(
    () =>
      refused instanceof ApiError
        ? refused.issues.map(({ path, message }) => ({ path: fieldPath(path), message }))
        : [],
    [refused],
  );
  return {
    curves: query.data ?? null,
    pending: draft === null || settled !== draft || query.isFetching || refused !== null,
    issues: draft === null ? issues : found,
    error: found.length > 0 ? null : refused,
  };
}
