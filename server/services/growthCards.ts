import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { LIMITS } from '../../shared/limits.ts';
import type { AppDependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { Group } from '../models/group.ts';
import type { GrowthCard } from '../models/growthCard.ts';
import type { Models } from '../models/models.ts';
import { isDesignRun } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import { takeCardContent } from './cardContent.ts';
import { insertLink, shareableRun, shareableStudy } from './links.ts';
import type { LinkSubject } from './links.ts';
import { recordActivity } from './recordActivity.ts';
import { makeSecret } from './secrets.ts';
import { shareAddress } from './shareAddress.ts';

type Person = { userId: string; name: string };
type WantedCard = z.output<typeof createGrowthCardSchema>;
type CardDependencies = Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'publicUrl'>;

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

/**
 * Computes what the card says and stores it, once and for all; where a link is wanted, the card holds its address. That
 * is the one place that keeps the token of a link: whoever may read the card may read it off the paper anyway.
 *
 * @param options.signal aborted when nobody waits for the card any more
 * @throws Refusal 422 with issues at the fields of the request, 409 when the design to link to has no numbers yet
 */
export async function createCard(
  { models, materials, pool, publicUrl }: CardDependencies,
  actor: Person,
  group: Group,
  wanted: WantedCard,
  { signal, isDemo = false }: { signal: AbortSignal; isDemo?: boolean },
): Promise<GrowthCard> {
  const cardId = randomUUID();
  const groupId = group.id;
  if (wanted.link?.expiresAt && Date.parse(wanted.link.expiresAt) <= Date.now()) {
    throw invalid([{ path: 'link.expiresAt', message: 'must be in the future' }]);
  }
  const origin = await originOf(models, groupId, wanted);
  const computed = await takeCardContent({ materials, pool }, groupId, wanted, signal);
  const { title, sampleId, link } = wanted;
  // Made before the link, because the card, which never changes, holds the address.
  const token = makeSecret();
  return models.sequelize.transaction(async (transaction) => {
    const card = await models.GrowthCard.create(
      {
        ...{ id: cardId, groupId, createdById: actor.userId, title, sampleId, isDemo },
        studyId: wanted.studyId ?? null,
        designId: wanted.designId ?? null,
        decision: { text: wanted.decision.text, by: actor.name, at: new Date().toISOString() },
        content: { ...computed.content, url: link && shareAddress(publicUrl(), token) },
        solverVersion: computed.solverVersion,
        inputSha256: computed.inputSha256,
      },
      { transaction },
    );
    if (link) {
      const label = `Growth card ${title}`.slice(0, LIMITS.nameLength);
      const expiresAt = link.expiresAt === null ? null : new Date(link.expiresAt);
      const opened = origin ?? { opens: 'card' as const, id: cardId, groupId, name: title };
      await insertLink(models, actor, opened, { label, expiresAt }, { transaction, token });
    }
    await recordActivity(
      models,
      { action: 'card.create', groupId, actor, subjectId: cardId, detail: { title } },
      transaction,
    );
    return card;
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

/**
 * The study or design that a card comes from, as what its link opens; null for a card that stands alone.
 *
 * @throws Refusal 422 when there is none in the group, or both are named
 */
async function originOf(
  models: Models,
  groupId: string,
  { studyId, designId, link }: WantedCard,
): Promise<LinkSubject | null> {
  if (studyId !== undefined && designId !== undefined) {
    throw invalid([{ path: 'designId', message: 'must be left out where studyId is given' }]);
  }
  if (studyId !== undefined) {
    const study = isRowId(studyId) ? await models.Study.findOne({ where: { id: studyId, groupId } }) : null;
    if (!study) throw invalid([{ path: 'studyId', message: 'there is no such study in this group' }]);
    return shareableStudy(study);
  }
  if (designId === undefined) return null;
  const design = isRowId(designId) ? await models.Run.findOne({ where: { id: designId, groupId } }) : null;
  if (!design || !isDesignRun(design)) {
    throw invalid([{ path: 'designId', message: 'there is no such design in this group' }]);
  }
  // Without a link it does not matter whether the design has its numbers.
  return link === null ? null : shareableRun(design);
}
