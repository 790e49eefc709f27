import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionSchema } from '../../../../shared/account.ts';
import type { SignIn } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { replaceSession } from './replaceSession.ts';

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignIn) => request({ method: 'POST', path: '/session', body, schema: sessionSchema }),
    onSuccess: (session) => replaceSession(client, session),
  });
}
