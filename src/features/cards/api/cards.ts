import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { growthCardListSchema, growthCardSchema } from '../../../../shared/growthCard.ts';
import type { CreateGrowthCard, GrowthCard } from '../../../../shared/growthCard.ts';
import { noContent, request } from '../../../lib/apiClient.ts';

/** A card never changes once it is made. */
export function cardQuery(cardId: string) {
  return queryOptions({
    queryKey: ['cards', cardId],
    queryFn: ({ signal }) => request({ path: `/cards/${cardId}`, schema: growthCardSchema, signal }),
    staleTime: Infinity,
  });
}

export function cardListQuery(groupId: string) {
  return queryOptions({
    queryKey: ['groups', groupId, 'cards'],
    queryFn: ({ signal }) =>
      request({ path: `/groups/${groupId}/cards`, schema: growthCardListSchema, signal }),
  });
}

export function useCreateCard(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateGrowthCard): Promise<GrowthCard> =>
      request({ method: 'POST', path: `/groups/${groupId}/cards`, body, schema: growthCardSchema }),
    onSuccess: (card) => {
      client.setQueryData(cardQuery(card.id).queryKey, card);
      void client.invalidateQueries({ queryKey: cardListQuery(groupId).queryKey });
    },
  });
}

export function useDeleteCard({ id, groupId }: Pick<GrowthCard, 'id' | 'groupId'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: `/cards/${id}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: cardListQuery(groupId).queryKey }),
  });
}
