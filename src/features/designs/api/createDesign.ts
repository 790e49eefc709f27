import { useMutation, useQueryClient } from '@tanstack/react-query';
import { designSchema } from '../../../../shared/design.ts';
import type { CreateDesign } from '../../../../shared/design.ts';
import { request } from '../../../lib/apiClient.ts';
import { designQuery } from './design.ts';

/** Starts a design. The same key sent twice (a double click, a repeated request) makes one. */
export function useCreateDesign() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, key }: { body: CreateDesign; key: string }) =>
      request({
        method: 'POST',
        path: '/designs',
        body,
        headers: { 'idempotency-key': key },
        schema: designSchema,
      }),
    onSuccess: (design) => {
      client.setQueryData(designQuery(design.id).queryKey, design);
      void client.invalidateQueries({ queryKey: ['groups', design.groupId] });
    },
  });
}
