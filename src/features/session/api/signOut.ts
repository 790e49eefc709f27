import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { replaceSession } from './replaceSession.ts';

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: '/session', schema: noContent }),
    onSuccess: () => replaceSession(client, null),
  });
}
