import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { ErrorState } from './ErrorState.tsx';
import { LoadingState } from './LoadingState.tsx';

type QueryGateProps<Data> = {
  query: UseQueryResult<Data>;
  /** What is loaded, in the plural: "stacks". */
  what: string;
  children: (data: Data) => ReactNode;
};

/** Loading, failed or there. Data that is on screen stays there when a later refresh fails. */
export function QueryGate<Data>({ query, what, children }: QueryGateProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  if (query.isError) {
    return (
      <ErrorState
        title={`The ${what} could not be loaded`}
        error={query.error}
        onRetry={() => void query.refetch()}
      />
    );
  }
  return <LoadingState label={`Loading the ${what}`} />;
}
