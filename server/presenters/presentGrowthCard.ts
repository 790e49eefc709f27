import type { z } from 'zod';
import type { GrowthCard as PresentedCard, SharedGrowthCard } from '../../shared/growthCard.ts';
import type { growthCardListSchema } from '../../shared/growthCard.ts';
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

export function presentCardList(cards: GrowthCard[]): z.input<typeof growthCardListSchema> {
  return {
    cards: cards.map(({ id, title, sampleId, createdAt, decision }) => ({
      ...{ id, title, sampleId, decision },
      createdAt: createdAt.toISOString(),
    })),
  };
}
