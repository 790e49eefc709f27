import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import type { CreateGrowthCard, GrowthCard } from '../../../../shared/growthCard.ts';
import { useRequestKey } from '../../../lib/useRequestKey.ts';
import { cardMakingQuery, useCreateCard } from '../api/cards.ts';

/** Makes one card at a time, tells how far it is, and can stop. Whoever leaves the page stops it too. */
export function useMakeCard(groupId: string, onMade: (card: GrowthCard) => void) {
  const create = useCreateCard(groupId);
  const keyOf = useRequestKey();
  const [key, setKey] = useState<string | null>(null);
  const underWay = useRef<AbortController | null>(null);
  const { data } = useQuery(cardMakingQuery(groupId, create.isPending ? key : null));
  useEffect(() => () => underWay.current?.abort(), []);

  const make = (body: CreateGrowthCard) => {
    // A second press before the first has been drawn.
    if (underWay.current) return;
    const stop = new AbortController();
    underWay.current = stop;
    setKey(keyOf(body));
    create.mutate(
      { body, key: keyOf(body), signal: stop.signal },
      { onSuccess: onMade, onSettled: () => (underWay.current = null) },
    );
  };
  const cancelled = create.error?.name === 'AbortError';
  return {
    make,
    cancel: () => underWay.current?.abort(),
    busy: create.isPending,
    isMade: create.isSuccess,
    /** Of the request that was cancelled: whether its card was stored all the same, the server knows. */
    cancelledKey: cancelled ? key : null,
    error: cancelled ? null : create.error,
    progress: data?.progress ?? null,
  };
}
