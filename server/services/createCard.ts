import { randomUUID } from 'node:crypto';
import { UniqueConstraintError } from 'sequelize';
import type { z } from 'zod';
import type { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { LIMITS } from '../../shared/limits.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { AppDependencies, MakeCard } from '../dependencies.ts';
import { conflict, invalid } from '../errors.ts';
import type { Group } from '../models/group.ts';
import type { GrowthCard } from '../models/growthCard.ts';
import type { Models } from '../models/models.ts';
import { isDesignRun } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import { askCardQuestion, takeCardContent } from './cardContent.ts';
import { idOfKey } from './idOfKey.ts';
import { insertLink, shareableRun, shareableStudy } from './links.ts';
import type { LinkSubject } from './links.ts';
import { recordActivity } from './recordActivity.ts';
import { makeSecret } from './secrets.ts';
import { shareAddress } from './shareAddress.ts';

type Person = { userId: string; name: string };
type WantedCard = z.output<typeof createGrowthCardSchema>;
type CardDependencies = Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'publicUrl' | 'jobs'>;
type Frame = { actor: Person; group: Group; id: string; isDemo: boolean };
type Watch = { signal: AbortSignal; report: Parameters<MakeCard>[1] };

/**
 * Computes what the card says and stores it, once and for all; where a link is wanted, the card holds its address. That
 * is the one place that keeps the token of a link: whoever may read the card may read it off the paper anyway.
 *
 * @param options.signal aborted when nobody waits for the card any more; then nothing of it is stored
 * @param options.idempotencyKey sent again with the same request, it gives the card of the first time
 * @throws Refusal 422 with issues at the fields of the request, 409 when the design to link to has no numbers yet or the
 *   key was used for something else; ComputeError `cancelled` when the signal aborted
 */
export async function createCard(
  dependencies: CardDependencies,
  actor: Person,
  group: Group,
  wanted: WantedCard,
  options: { signal: AbortSignal; idempotencyKey?: string | null; isDemo?: boolean },
): Promise<GrowthCard> {
  const { signal, idempotencyKey = null, isDemo = false } = options;
  const id = idempotencyKey === null ? randomUUID() : idOfKey(actor, group, idempotencyKey);
  return dependencies.jobs.cards.make(id, wanted, signal, (ending, report) =>
    makeCard(dependencies, { actor, group, id, isDemo }, wanted, { signal: ending, report }),
  );
}

async function makeCard(
  { models, materials, pool, publicUrl }: CardDependencies,
  frame: Frame,
  wanted: WantedCard,
  watch: Watch,
): Promise<GrowthCard> {
  if (wanted.link?.expiresAt && Date.parse(wanted.link.expiresAt) <= Date.now()) {
    throw invalid([{ path: 'link.expiresAt', message: 'must be in the future' }]);
  }
  const origin = await originOf(models, frame.group.id, wanted);
  const question = await askCardQuestion({ materials, pool }, frame.group.id, wanted);
  const { inputSha256, solverVersion } = question.snapshot;
  const first = await firstOf(models, frame.id, wanted, inputSha256);
  if (first) return first;
  const content = await takeCardContent({ materials, pool }, wanted, question, watch);
  const { samples } = wanted.tolerance;
  watch.report({ step: 'card', done: samples, total: samples });
  const computed = { content, inputSha256, solverVersion };
  try {
    return await storeCard({ models, publicUrl }, frame, wanted, { computed, origin, signal: watch.signal });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    // The same request was sent to another process, which was faster.
    const faster = await firstOf(models, frame.id, wanted, inputSha256);
    if (faster) return faster;
    throw error;
  }
}

/** @throws Refusal 409 when the card of this id is another one */
async function firstOf(
  models: Models,
  id: string,
  wanted: WantedCard,
  inputSha256: string,
): Promise<GrowthCard | null> {
  const first = await models.GrowthCard.findByPk(id);
  if (!first) return null;
  const isSame =
    first.inputSha256 === inputSha256 &&
    first.title === wanted.title &&
    first.sampleId === wanted.sampleId &&
    first.decision.text === wanted.decision.text &&
    first.content.bench === wanted.bench;
  if (!isSame) throw conflict('This Idempotency-Key was used for another card: send a new one.');
  return first;
}

type Stored = {
  computed: Pick<GrowthCard, 'inputSha256' | 'solverVersion'> & {
    content: Omit<GrowthCard['content'], 'url'>;
  };
  origin: LinkSubject | null;
  signal: AbortSignal;
};

async function storeCard(
  { models, publicUrl }: Pick<CardDependencies, 'models' | 'publicUrl'>,
  { actor, group: { id: groupId }, id, isDemo }: Frame,
  { title, sampleId, decision, link, studyId, designId }: WantedCard,
  { computed: { content, ...origins }, origin, signal }: Stored,
): Promise<GrowthCard> {
  // Made before the link, because the card, which never changes, holds the address.
  const token = makeSecret();
  return models.sequelize.transaction(async (transaction) => {
    const card = await models.GrowthCard.create(
      {
        ...{ ...origins, id, groupId, createdById: actor.userId, title, sampleId, isDemo },
        studyId: studyId ?? null,
        designId: designId ?? null,
        decision: { text: decision.text, by: actor.name, at: new Date().toISOString() },
        content: { ...content, url: link && shareAddress(publicUrl(), token) },
      },
      { transaction },
    );
    if (link) {
      const label = `Growth card ${title}`.slice(0, LIMITS.nameLength);
      const expiresAt = link.expiresAt === null ? null : new Date(link.expiresAt);
      const opened = origin ?? { opens: 'card' as const, id, groupId, name: title };
      await insertLink(models, actor, opened, { label, expiresAt }, { transaction, token });
    }
    await recordActivity(
      models,
      { action: 'card.create', groupId, actor, subjectId: id, detail: { title } },
      transaction,
    );
    // As late as can be: what is thrown here takes back the card, its link and the line about it.
    if (signal.aborted) throw new ComputeError('cancelled', 'The card was cancelled.');
    return card;
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
