import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import { explainQuery } from '../api/explain.ts';

/** The readings strip comes first; what explains it follows when the typing has stopped. */
const PAUSE_MS = 180;

export type Solved = {
  /** The last answer there was. */
  response: SolveResponse | null;
  /** Whether it is of an earlier state of the film. */
  pending: boolean;
  error: Error | null;
};

/** The answer to a request, asked once the film stands still. Keep the request stable between renders. */
export function useSolved(request: LibrarySolveRequest): Solved {
  const [settled, setSettled] = useState(request);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(request), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [request]);
  const query = useQuery({ ...explainQuery(settled), placeholderData: keepPreviousData, retry: false });
  return {
    response: query.data ?? null,
    pending: settled !== request || query.isFetching,
    error: settled === request ? query.error : null,
  };
}
