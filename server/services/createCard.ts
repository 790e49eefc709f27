import { randomUUID } from 'node:crypto';
import { UniqueConstraintError } from 'sequelize';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { LIMITS } from '../../shared/limits.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { AppDependencies, MakeCard } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { Group } from '../models/group.ts';
import type { GrowthCard } from '../models/growthCard.ts';
import type { Models } from '../models/models.ts';
import { addToGroup } from '../policies/group.ts';
import { requireAllowed } from '../policies/requireAllowed.ts';
import { askCardQuestion, takeCardContent } from './cardContent.ts';
import { cardOrigin } from './cardOrigin.ts';
import { firstCard } from './firstCard.ts';
import { idOfKey } from './idOfKey.ts';
import { insertLink } from './links.ts';
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
 * @throws Refusal 422 with issues at the fields of the request, 403 or 404 when the person lost the role meanwhile, 409 when the design to link to has no numbers yet or the
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
  await cardOrigin(models, frame.group.id, wanted);
  const question = await askCardQuestion({ materials, pool }, frame.group.id, wanted);
  const { inputSha256, solverVersion } = question.snapshot;
  const first = await firstCard(models, frame.id, wanted, question);
  if (first) return first;
  const content = await takeCardContent({ materials, pool }, wanted, question, watch);
  const { samples } = wanted.tolerance;
  watch.report({ step: 'card', done: samples, total: samples });
  const computed = { content, inputSha256, solverVersion };
  try {
    return await storeCard({ models, publicUrl }, frame, wanted, { computed, signal: watch.signal });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    // The same request was sent to another process, which was faster.
    const faster = await firstCard(models, frame.id, wanted, question);
    if (faster) return faster;
    throw error;
  }
}

type Stored = {
  computed: Pick<GrowthCard, 'inputSha256' | 'solverVersion'> & {
    content: Omit<GrowthCard['content'], 'url'>;
  };
  signal: AbortSignal;
};

async function storeCard(
  { models, publicUrl }: Pick<CardDependencies, 'models' | 'publicUrl'>,
  { actor, group, id, isDemo }: Frame,
  wanted: WantedCard,
  { computed: { content, ...origins }, signal }: Stored,
): Promise<GrowthCard> {
  const { title, sampleId, decision, link, studyId, designId } = wanted;
  const groupId = group.id;
  // Made before the link, because the card, which never changes, holds the address.
  const token = makeSecret();
  return models.sequelize.transaction(async (transaction) => {
    // Both were so when the card was begun, which may be minutes ago.
    await requireRole(models, actor, group, transaction);
    const origin = await cardOrigin(models, groupId, wanted, transaction);
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
 * As the route that makes cards, by the role of now, which nobody can change until the transaction ends.
 *
 * @throws Refusal 404 when they have left the group, 403 when their role does not reach any more
 */
async function requireRole(
  { Membership }: Models,
  { userId }: Person,
  group: Group,
  transaction: Transaction,
): Promise<void> {
  const where = { userId, groupId: group.id };
  const membership = await Membership.findOne({ where, transaction, lock: transaction.LOCK.SHARE });
  const roles = new Map(membership ? [[group.id, membership.role]] : []);
  requireAllowed(addToGroup, { roles }, group, 'group');
}
