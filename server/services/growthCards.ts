import type { GrowthCard } from '../models/growthCard.ts';
import type { Models } from '../models/models.ts';
import { recordActivity } from './recordActivity.ts';

type Person = { userId: string; name: string };

/** Cards of a group that a list shows. */
const LISTED_CARDS = 500;

export function loadCard(models: Models, cardId: string): Promise<GrowthCard | null> {
  return models.GrowthCard.findByPk(cardId);
}

/** The newest cards of a group, newest first. What they say stays in the database. */
export function listCards(models: Models, groupId: string): Promise<GrowthCard[]> {
  return models.GrowthCard.findAll({
    where: { groupId },
    attributes: { exclude: ['content'] },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    limit: LISTED_CARDS,
  });
}

/** Deletes a card; links that open it end, those to the study or design it came from stay. */
export async function deleteCard(models: Models, actor: Person, card: GrowthCard): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    await models.ShareLink.update(
      { revokedAt: new Date() },
      { where: { cardId: card.id, revokedAt: null }, transaction },
    );
    await card.destroy({ transaction });
    const { groupId, id: subjectId, title } = card;
    await recordActivity(
      models,
      { action: 'card.delete', groupId, actor, subjectId, detail: { title } },
      transaction,
    );
  });
}
