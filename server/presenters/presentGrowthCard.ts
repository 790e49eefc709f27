import type { z } from 'zod';
import type { CardMaking, GrowthCard as PresentedCard, SharedGrowthCard } from '../../shared/growthCard.ts';
import type { growthCardListSchema } from '../../shared/growthCard.ts';
import type { CardProgress } from '../dependencies.ts';
import type { GrowthCard } from '../models/growthCard.ts';

export function presentGrowthCard(card: GrowthCard): PresentedCard {
  const { groupId, studyId, designId } = card;
  return { ...presentSharedGrowthCard(card), groupId, studyId, designId };
}

/** What a share link shows of a card, and what its PDF prints: nothing of the group but the card itself. */
export function presentSharedGrowthCard(card: GrowthCard): SharedGrowthCard {
  const { id, title, sampleId, decision, content, solverVersion, inputSha256, createdAt, isDemo } = card;
  return {
    ...{ id, title, sampleId, decision, solverVersion, inputSha256, isDemo },
    ...content,
    createdAt: createdAt.toISOString(),
  };
}

/**
 * @param progress null when no such card is being made
 * @param cardId of the card that was stored, null when there is none
 */
export function presentCardMaking(progress: CardProgress | null, cardId: string | null): CardMaking {
  if (!progress) return { progress: null, cardId };
  const { step, done, total, bandsSince } = progress;
  const seconds = bandsSince === null ? 0 : (Date.now() - bandsSince) / 1000;
  const hasRate = step === 'bands' && done > 0;
  return {
    progress: { step, done, total, secondsLeft: hasRate ? (seconds / done) * (total - done) : null },
    cardId,
  };
}

export function presentCardList(cards: GrowthCard[]): z.input<typeof growthCardListSchema> {
  return {
    cards: cards.map(({ id, title, sampleId, createdAt, decision }) => ({
      ...{ id, title, sampleId, decision },
      createdAt: createdAt.toISOString(),
    })),
  };
}
