import { useMutation } from '@tanstack/react-query';
import { materialSchema } from '../../../../shared/material.ts';
import type { Material } from '../../../../shared/material.ts';
import type { CreateMaterial, CreateMaterialVersion } from '../../../../shared/materialEdit.ts';
import { request } from '../../../lib/apiClient.ts';
import { useRequestKey } from '../../../lib/useRequestKey.ts';

/** Either a new material of the group or a new version of one that is there. */
export type KeepImported =
  | { kind: 'material'; groupId: string; body: CreateMaterial }
  | { kind: 'version'; materialId: string; body: CreateMaterialVersion };

export function useKeepImported(onKept: (material: Material) => void) {
  const keyOf = useRequestKey();
  return useMutation({
    mutationFn: (kept: KeepImported) =>
      request({
        method: 'POST',
        path:
          kept.kind === 'material'
            ? `/groups/${kept.groupId}/materials`
            : `/materials/${encodeURIComponent(kept.materialId)}/versions`,
        body: kept.body,
        // A version sent twice is one version without a key.
        ...(kept.kind === 'material' && { headers: { 'idempotency-key': keyOf(kept.body) } }),
        schema: materialSchema,
      }),
    onSuccess: onKept,
  });
}
