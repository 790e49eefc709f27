import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './apiClient.ts';

/** A refusal stays a refusal; only a lost connection or a server in trouble is worth another try. */
function worthRetrying(failures: number, error: Error): boolean {
  const passing = error instanceof ApiError && (error.code === 'network' || error.status >= 500);
  return passing && failures < 2;
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { staleTime: 15_000, retry: worthRetrying, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
