import { useMutation } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';

/** The answer is 202 whether or not the address is known, so nobody can find out who has an account. */
export function useRequestPasswordReset() {
  return useMutation({
    mutationFn: (body: { email: string }) =>
      request({ method: 'POST', path: '/password-resets', body, schema: noContent }),
  });
}
