import { useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { Design } from '../../../../shared/design.ts';
import type { RunProgress } from '../../../../shared/run.ts';
import { isOver, useProgressEvents } from '../../../lib/useProgressEvents.ts';
import { designQuery } from '../api/design.ts';

/** Follows a design that is not over yet, as runs are followed; its end loads the whole design anew. */
export function useDesignProgress(design: Design | undefined): void {
  const client = useQueryClient();
  const id = design?.id ?? '';
  const over = design === undefined || isOver(design.progress.state);
  const take = useCallback(
    (progress: RunProgress) => {
      const { queryKey } = designQuery(id);
      if (isOver(progress.state)) void client.invalidateQueries({ queryKey });
      else client.setQueryData(queryKey, (known) => known && { ...known, progress });
    },
    [client, id],
  );
  useProgressEvents(over ? null : `/designs/${id}/events`, take);
}
