import { useMutation } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';

export function useResetPassword() {
  return useMutation({
    mutationFn: (body: { token: string; password: string }) =>
      request({ method: 'POST', path: '/password-resets/complete', body, schema: noContent }),
  });
}
