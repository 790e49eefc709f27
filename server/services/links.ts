import { Op, fn, literal } from 'sequelize';
import type { Transaction } from 'sequelize';
import { conflict, gone, invalid } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { Link } from '../../shared/link.ts';
import type { GrowthCard } from '../models/growthCard.ts';
import type { Run } from '../models/run.ts';
import { isDesignRun } from '../models/run.ts';
import type { ShareLink } from '../models/shareLink.ts';
import type { Study } from '../models/study.ts';
import { recordActivity } from './recordActivity.ts';
import { hashSecret, makeSecret } from './secrets.ts';

type Person = { userId: string; name: string };
type WantedLink = { label: string; expiresAt: Date | null };

/** A link with what it opens, whole. */
export type OpenedLink = { link: ShareLink } & (
  | { opens: 'run' | 'design'; run: Run }
  | { opens: 'study'; study: Study }
  | { opens: 'card'; card: GrowthCard }
);

/** What a link opens. */
export type LinkSubject = { opens: Link['opens']; id: string; groupId: string; name: string };

/** A link with what a list shows of it. */
export type LinkWithSubject = { link: ShareLink; subject: Omit<LinkSubject, 'groupId'> };

/**
 * A sweep or a design as the subject of a link.
 *
 * @throws Refusal 409 while it has no numbers
 */
export function shareableRun(run: Run): LinkSubject {
  const opens = opensOf(run);
  if (run.state !== 'done') {
    throw conflict(`The ${opens} is ${run.state}: a link can be made once it has its numbers.`);
  }
  return { opens, id: run.id, groupId: run.groupId, name: run.name };
}

function opensOf(run: Run): 'run' | 'design' {
  return isDesignRun(run) ? 'design' : 'run';
}

export function shareableStudy({ id, groupId, title }: Study): LinkSubject {
  return { opens: 'study', id, groupId, name: title };
}

const subjectColumns = { run: 'runId', design: 'runId', study: 'studyId', card: 'cardId' } as const;

/**
 * Makes a link that opens its subject without an account.
 *
 * @param wanted.expiresAt when it stops to open; null for never
 * @returns the link and its token, which is stored as a hash only and cannot be shown again
 * @throws Refusal 422 when the link would have expired already
 */
export async function createLink(
  models: Models,
  actor: Person,
  subject: LinkSubject,
  wanted: WantedLink,
): Promise<{ link: LinkWithSubject; token: string }> {
  const { linkId, token } = await models.sequelize.transaction((transaction) =>
    insertLink(models, actor, subject, wanted, { transaction }),
  );
  const [link] = await listLinks(models, { id: linkId });
  if (!link) throw new Error(`Link ${linkId} is gone right after its making.`);
  return { link, token };
}

/**
 * As createLink, in the transaction of what the link is made for.
 *
 * @param options.token of makeSecret, where the address had to be known before
 */
export async function insertLink(
  models: Models,
  actor: Person,
  { opens, id, groupId, name }: LinkSubject,
  wanted: WantedLink,
  { transaction, token = makeSecret() }: { transaction: Transaction; token?: string },
): Promise<{ linkId: string; token: string }> {
  if (wanted.expiresAt !== null && wanted.expiresAt.getTime() <= Date.now()) {
    throw invalid([{ path: 'expiresAt', message: 'must be in the future' }]);
  }
  const link = await models.ShareLink.create(
    {
      ...{ ...wanted, groupId, tokenHash: hashSecret(token), createdById: actor.userId, runId: null },
      [subjectColumns[opens]]: id,
    },
    { transaction },
  );
  const detail = { [opens]: name, label: wanted.label };
  await recordActivity(
    models,
    { action: 'link.create', groupId, actor, subjectId: link.id, detail },
    transaction,
  );
  return { linkId: link.id, token };
}

/** Links whose subject exists, newest first. Those of deleted ones open nothing and are not listed. */
export async function listLinks(
  models: Models,
  where: { id: string } | { runId: string } | { studyId: string } | { groupId: string },
): Promise<LinkWithSubject[]> {
  const links = await models.ShareLink.findAll({
    where: {
      [Op.or]: Object.values(subjectColumns).map((column) => ({ [column]: { [Op.ne]: null } })),
      ...where,
    },
    include: [
      'createdBy',
      { association: 'run', attributes: ['id', 'name', 'kind'] },
      { association: 'study', attributes: ['id', 'title'] },
      { association: 'card', attributes: ['id', 'title'] },
    ],
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
  });
  return links.flatMap((link) => {
    const subject = listedSubject(link);
    return subject ? [{ link, subject }] : [];
  });
}

function listedSubject({ run, study, card }: ShareLink): LinkWithSubject['subject'] | null {
  if (run) return { opens: opensOf(run), id: run.id, name: run.name };
  if (study) return { opens: 'study', id: study.id, name: study.title };
  return card ? { opens: 'card', id: card.id, name: card.title } : null;
}

/** From now on the link answers 410. Revoking twice keeps the first time. */
export async function revokeLink(models: Models, actor: Person, link: ShareLink): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    const [count] = await models.ShareLink.update(
      { revokedAt: fn('now') },
      { where: { id: link.id, revokedAt: null }, transaction },
    );
    if (count === 0) return;
    const { groupId, id: subjectId, label } = link;
    await recordActivity(
      models,
      { action: 'link.revoke', groupId, actor, subjectId, detail: { label } },
      transaction,
    );
  });
}

/**
 * What a token opens; null for a token that never was.
 *
 * @throws Refusal 410 when the link was revoked, has expired, or its subject was deleted
 */
export async function openLink(models: Models, token: string): Promise<OpenedLink | null> {
  const link = await models.ShareLink.findOne({
    where: { tokenHash: hashSecret(token) },
    include: ['run', 'study', 'card'],
  });
  if (!link) return null;
  const { run, study, card } = link;
  if (link.revokedAt || !(run ?? study ?? card)) {
    throw gone('This link was revoked. Ask whoever sent it for a new one.');
  }
  if (link.expiresAt && link.expiresAt.getTime() <= Date.now()) {
    throw gone('This link has expired. Ask whoever sent it for a new one.');
  }
  if (run) return { link, opens: opensOf(run), run };
  if (study) return { link, opens: 'study', study };
  return card ? { link, opens: 'card', card } : null;
}

/** Remembers that somebody opened the link. */
export async function countLinkUse(models: Models, link: ShareLink): Promise<void> {
  await models.ShareLink.update(
    { lastUsedAt: fn('now'), useCount: literal('use_count + 1') },
    { where: { id: link.id } },
  );
}
