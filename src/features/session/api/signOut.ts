import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { sessionQuery } from './session.ts';

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: '/session', schema: noContent }),
    onSuccess: () => {
      // First the session, so that pages leave; then what they held.
      client.setQueryData(sessionQuery().queryKey, null);
      client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    },
  });
}
