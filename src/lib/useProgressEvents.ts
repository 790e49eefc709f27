import { useEffect } from 'react';
import { runProgressSchema } from '../../shared/run.ts';
import type { RunProgress, RunState } from '../../shared/run.ts';

export function isOver(state: RunState): boolean {
  return state === 'done' || state === 'failed' || state === 'cancelled';
}

/**
 * Follows stored work by the server's events until it is over. The browser connects again by itself after a break.
 *
 * @param path of the events under /api/v1; null where there is nothing to follow
 * @param onProgress called with every state; keep it stable between renders
 */
export function useProgressEvents(path: string | null, onProgress: (progress: RunProgress) => void): void {
  useEffect(() => {
    if (path === null) return;
    const events = new EventSource(`/api/v1${path}`);
    events.addEventListener('progress', (event: MessageEvent<string>) => {
      const progress = runProgressSchema.safeParse(JSON.parse(event.data));
      if (!progress.success) return;
      if (isOver(progress.data.state)) events.close();
      onProgress(progress.data);
    });
    return () => events.close();
  }, [path, onProgress]);
}
