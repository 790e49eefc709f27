import { useMutation, useQueryClient } from '@tanstack/react-query';
import { materialSchema } from '../../../../shared/material.ts';
import type { CreateMaterial } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';

export function useCreateMaterial(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateMaterial) =>
      request({ method: 'POST', path: `/groups/${groupId}/materials`, body, schema: materialSchema }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['groups', groupId] }),
  });
}
