import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionSchema } from '../../../../shared/account.ts';
import type { SignIn } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { sessionQuery } from './session.ts';

/** Signs in; whatever an earlier person left in the cache is dropped. */
export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignIn) => request({ method: 'POST', path: '/session', body, schema: sessionSchema }),
    onSuccess: (session) => {
      client.clear();
      client.setQueryData(sessionQuery().queryKey, session);
    },
  });
}
