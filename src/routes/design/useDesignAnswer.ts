import { useQuery } from '@tanstack/react-query';
import type { Design, DesignResult } from '../../../shared/design.ts';
import { designResultQuery, partialDesignResultQuery } from '../../features/designs/api/designResult.ts';

export type DesignAnswer = {
  /** The answer, or of a search what it has found before its end; undefined while there is none. */
  shown: DesignResult | undefined;
  /** Whether what a stopped search had found is there; undefined until that is known. */
  kept: boolean | undefined;
  error: Error | null;
  retry: () => void;
};

/** The answer of a design that is done; of a search under way what it has found so far, of one that was stopped what it had. */
export function useDesignAnswer({ id, kind, progress: { state, done } }: Design): DesignAnswer {
  const path = `/designs/${id}`;
  const finished = state === 'done';
  // Before the first films are solved there is nothing to ask for.
  const partly = kind === 'optimise' && !finished && state !== 'queued' && done > 0;
  const result = useQuery({ ...designResultQuery(path), enabled: finished });
  const partial = useQuery({ ...partialDesignResultQuery(path, state === 'running'), enabled: partly });
  return {
    shown: finished ? result.data : partly ? partial.data : undefined,
    kept: !partly ? false : partial.isPending ? undefined : partial.data !== undefined,
    error: finished ? result.error : null,
    retry: () => void result.refetch(),
  };
}
