import { useMutation, useQueryClient } from '@tanstack/react-query';
import { noContent, request } from '../../../lib/apiClient.ts';
import { materialListQuery } from './materialList.ts';

export function useDeleteMaterial(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (materialId: string) =>
      request({
        method: 'DELETE',
        path: `/materials/${encodeURIComponent(materialId)}`,
        schema: noContent,
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: materialListQuery(groupId).queryKey }),
  });
}
