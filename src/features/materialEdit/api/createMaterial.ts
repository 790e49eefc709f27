import { useMutation, useQueryClient } from '@tanstack/react-query';
import { materialSchema } from '../../../../shared/material.ts';
import type { CreateMaterial } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';
import { useRequestKey } from '../../../lib/useRequestKey.ts';

export function useCreateMaterial(groupId: string) {
  const client = useQueryClient();
  const keyOf = useRequestKey();
  return useMutation({
    mutationFn: (body: CreateMaterial) =>
      request({
        method: 'POST',
        path: `/groups/${groupId}/materials`,
        body,
        headers: { 'idempotency-key': keyOf(body) },
        schema: materialSchema,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['groups', groupId] }),
  });
}
