import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { runProgressSchema } from '../../../../shared/run.ts';
import type { Run, RunState } from '../../../../shared/run.ts';
import { runQuery } from '../api/run.ts';

export function isOver(state: RunState): boolean {
  return state === 'done' || state === 'failed' || state === 'cancelled';
}

/**
 * Follows a run that is not over yet: the server's events write its progress into the query, and its end loads the
 * whole run anew. The browser connects again by itself after a break.
 */
export function useRunProgress(run: Run | undefined): void {
  const client = useQueryClient();
  const id = run?.id;
  const over = run === undefined || isOver(run.progress.state);
  useEffect(() => {
    if (id === undefined || over) return;
    const { queryKey } = runQuery(id);
    const events = new EventSource(`/api/v1/runs/${id}/events`);
    events.addEventListener('progress', (event: MessageEvent<string>) => {
      const progress = runProgressSchema.safeParse(JSON.parse(event.data));
      if (!progress.success) return;
      if (isOver(progress.data.state)) {
        events.close();
        void client.invalidateQueries({ queryKey });
      } else {
        client.setQueryData(queryKey, (known) => known && { ...known, progress: progress.data });
      }
    });
    return () => events.close();
  }, [client, id, over]);
}
