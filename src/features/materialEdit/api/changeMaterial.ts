import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { materialSchema } from '../../../../shared/material.ts';
import type { CreateMaterialVersion, renameMaterialSchema } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';

function useRefresh(materialId: string, groupId: string) {
  const client = useQueryClient();
  return async () => {
    await Promise.all([
      client.invalidateQueries({ queryKey: ['materials', materialId] }),
      client.invalidateQueries({ queryKey: ['groups', groupId] }),
    ]);
  };
}

/** Makes a new version over the one named in the body; 409 when that is no longer the newest. */
export function useSaveVersion(materialId: string, groupId: string) {
  const refresh = useRefresh(materialId, groupId);
  return useMutation({
    mutationFn: (body: CreateMaterialVersion) =>
      request({ method: 'POST', path: `/materials/${materialId}/versions`, body, schema: materialSchema }),
    onSuccess: refresh,
  });
}

/** Changes what a material is called; its constants stay as they are. */
export function useRenameMaterial(materialId: string, groupId: string) {
  const refresh = useRefresh(materialId, groupId);
  return useMutation({
    mutationFn: (body: z.input<typeof renameMaterialSchema>) =>
      request({ method: 'PATCH', path: `/materials/${materialId}`, body, schema: materialSchema }),
    onSuccess: refresh,
  });
}
