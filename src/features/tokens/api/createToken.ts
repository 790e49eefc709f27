import { useMutation, useQueryClient } from '@tanstack/react-query';
import { createdTokenSchema } from '../../../../shared/account.ts';
import { request } from '../../../lib/apiClient.ts';
import { tokenListQuery } from './tokenList.ts';

export function useCreateToken() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { name: string }) =>
      request({ method: 'POST', path: '/tokens', body, schema: createdTokenSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: tokenListQuery().queryKey }),
  });
}
