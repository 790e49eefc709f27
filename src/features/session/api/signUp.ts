import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionSchema } from '../../../../shared/account.ts';
import type { SignUp } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { replaceSession } from './replaceSession.ts';

/** Makes an account with its personal group and signs in. */
export function useSignUp() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignUp) => request({ method: 'POST', path: '/accounts', body, schema: sessionSchema }),
    onSuccess: (session) => replaceSession(client, session),
  });
}
