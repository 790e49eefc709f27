import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { tokenListQuery } from './tokenList.ts';

export function useRevokeToken() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (tokenId: string) =>
      request({ method: 'DELETE', path: `/tokens/${tokenId}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: tokenListQuery().queryKey }),
  });
}
