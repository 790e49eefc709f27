import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { cardMakingSchema, growthCardListSchema, growthCardSchema } from '../../../../shared/growthCard.ts';
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

const POLL_MS = 300;

/** How far the card is that is being made under a key; asked again and again while there is one. */
export function cardMakingQuery(groupId: string, key: string | null) {
  return queryOptions({
    queryKey: ['groups', groupId, 'cardsInMaking', key],
    queryFn: ({ signal }) =>
      request({ path: `/groups/${groupId}/cards-in-making/${key}`, schema: cardMakingSchema, signal }),
    enabled: key !== null,
    refetchInterval: POLL_MS,
    gcTime: 0,
    retry: false,
  });
}

/** What became of the card that was cancelled under a key; asked until the server has ended with it. */
export function cancelledCardQuery(groupId: string, key: string) {
  return queryOptions({
    ...cardMakingQuery(groupId, key),
    // Of its own: an answer from before the cancel says nothing of this.
    queryKey: ['groups', groupId, 'cancelledCards', key],
    refetchInterval: ({ state }) =>
      state.status === 'error' || state.data?.progress === null ? false : POLL_MS,
  });
}

/** The same key sent twice (a double click, a repeated request) makes one card; an aborted signal makes none. */
export function useCreateCard(groupId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, key, signal }: { body: CreateGrowthCard; key: string; signal: AbortSignal }) =>
      request({
        method: 'POST',
        path: `/groups/${groupId}/cards`,
        body,
        headers: { 'idempotency-key': key },
        schema: growthCardSchema,
        signal,
      }),
    onSuccess: (card) => client.setQueryData(cardQuery(card.id).queryKey, card),
    // Also after a cancel, which may have come a moment too late.
    onSettled: () => client.invalidateQueries({ queryKey: cardListQuery(groupId).queryKey }),
  });
}

export function useDeleteCard({ id, groupId }: Pick<GrowthCard, 'id' | 'groupId'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request({ method: 'DELETE', path: `/cards/${id}`, schema: noContent }),
    onSuccess: () => client.invalidateQueries({ queryKey: cardListQuery(groupId).queryKey }),
  });
}
