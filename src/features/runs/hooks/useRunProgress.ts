import { useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { Run, RunProgress } from '../../../../shared/run.ts';
import { isOver, useProgressEvents } from '../../../lib/useProgressEvents.ts';
import { runQuery } from '../api/run.ts';

/**
 * Follows a run that is not over yet: the server's events write its progress into the query, and its end loads the
 * whole run anew.
 */
export function useRunProgress(run: Run | undefined): void {
  const client = useQueryClient();
  const id = run?.id ?? '';
  const over = run === undefined || isOver(run.progress.state);
  const take = useCallback(
    (progress: RunProgress) => {
      const { queryKey } = runQuery(id);
      if (isOver(progress.state)) void client.invalidateQueries({ queryKey });
      else client.setQueryData(queryKey, (known) => known && { ...known, progress });
    },
    [client, id],
  );
  useProgressEvents(over ? null : `/runs/${id}/events`, take);
}
