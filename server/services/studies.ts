import { isDeepStrictEqual } from 'node:util';
import { col, Op } from 'sequelize';
import type { Includeable, Transaction } from 'sequelize';
import type { z } from 'zod';
import type { StudyDocument, createStudySchema, updateStudySchema } from '../../shared/study.ts';
import { conflict, notFound } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { Study } from '../models/study.ts';
import type { StudyVersion } from '../models/studyVersion.ts';
import { recordActivity } from './recordActivity.ts';
import { studyChanges } from './studyChanges.ts';
import { namesOfItems, refuseForeignItems } from './studyItems.ts';

type Person = { userId: string; name: string };
type NewStudy = z.output<typeof createStudySchema> & { isDemo?: boolean };
type StudyUpdate = z.output<typeof updateStudySchema>;
export type StudyWithVersion = { study: Study; newest: StudyVersion };

/** The study and its newest version with the author; null when there is no such study. */
export async function loadStudy(models: Models, studyId: string): Promise<StudyWithVersion | null> {
  const study = await models.Study.findByPk(studyId, { include: newestVersion() });
  return study && withVersion(study);
}

/** The studies of a group, the one saved last first. Their documents are left in the database. */
export async function listStudies(models: Models, groupId: string): Promise<StudyWithVersion[]> {
  const studies = await models.Study.findAll({
    where: { groupId },
    include: newestVersion(['document', 'changes']),
    order: [
      ['updatedAt', 'DESC'],
      ['id', 'ASC'],
    ],
  });
  return studies.map(withVersion);
}

function newestVersion(exclude: string[] = []): Includeable {
  return {
    association: 'versions',
    where: { version: { [Op.eq]: col('Study.version') } },
    attributes: { exclude },
    include: ['author'],
  };
}

function withVersion(study: Study): StudyWithVersion {
  const newest = study.versions?.[0];
  if (!newest) throw new Error(`Study ${study.id} has no version ${study.version}`);
  return { study, newest };
}

/** Every version with its author, newest first, without the documents. */
export function listStudyVersions(models: Models, studyId: string): Promise<StudyVersion[]> {
  return models.StudyVersion.findAll({
    where: { studyId },
    attributes: { exclude: ['document'] },
    include: ['author'],
    order: [['version', 'DESC']],
  });
}

/**
 * Puts a new study into the group, as its version 1.
 *
 * @throws Refusal 422 when it names a run or design that is not the group's
 */
export async function createStudy(
  models: Models,
  actor: Person,
  groupId: string,
  { title, document, isDemo = false }: NewStudy,
): Promise<StudyWithVersion> {
  const studyId = await models.sequelize.transaction(async (transaction) => {
    await refuseForeignItems(models, groupId, document, null, transaction);
    const decided = document.decision.trim() !== '';
    const study = await models.Study.create(
      {
        ...{ groupId, title, isDemo, version: 1 },
        ...summaryOf(document),
        decidedBy: decided ? actor.name : null,
        decidedAt: decided ? new Date() : null,
      },
      { transaction },
    );
    await models.StudyVersion.create(
      { studyId: study.id, version: 1, title, document, changes: ['Study made.'], authorId: actor.userId },
      { transaction },
    );
    await recordActivity(
      models,
      {
        ...{ action: 'study.create', groupId, actor, subjectId: study.id },
        detail: { title, ...(isDemo && { isDemo }) },
      },
      transaction,
    );
    return study.id;
  });
  return reload(models, studyId);
}

/**
 * Saves a new version over the one that the edit started from; a save that changes nothing makes none. Whoever edits the
 * words of the decision is the one who decided, at that time.
 *
 * @throws Refusal 409 when somebody saved meanwhile, 422 when it names a run or design that is not the group's
 */
export async function updateStudy(
  models: Models,
  actor: Person,
  studyId: string,
  update: StudyUpdate,
): Promise<StudyWithVersion> {
  await models.sequelize.transaction(async (transaction) => {
    const study = await models.Study.findByPk(studyId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!study) throw notFound('study');
    const newest = await models.StudyVersion.findOne({
      where: { studyId, version: study.version },
      include: 'author',
      transaction,
    });
    if (!newest) throw new Error(`Study ${studyId} has no version ${study.version}`);
    const next = { title: update.title ?? newest.title, document: update.document ?? newest.document };
    const changesNothing = next.title === newest.title && isDeepStrictEqual(next.document, newest.document);
    if (update.version !== study.version) {
      // The same save sent twice is one save.
      const isSameSave = update.version === newest.version - 1 && newest.authorId === actor.userId;
      if (isSameSave && changesNothing) return;
      throw staleVersion(newest, update.version);
    }
    if (!changesNothing) await saveVersion(models, actor, { study, newest }, next, transaction);
  });
  return reload(models, studyId);
}

async function saveVersion(
  models: Models,
  actor: Person,
  { study, newest }: StudyWithVersion,
  next: { title: string; document: StudyDocument },
  transaction: Transaction,
): Promise<void> {
  const { groupId, id: studyId } = study;
  await refuseForeignItems(models, groupId, next.document, newest.document, transaction);
  const nameOf = await namesOfItems(models, groupId, [newest.document, next.document], transaction);
  const changes = studyChanges(newest, next, nameOf);
  const version = study.version + 1;
  await models.StudyVersion.create(
    { ...next, studyId, version, changes, authorId: actor.userId },
    { transaction },
  );
  const decision = next.document.decision.trim();
  const isEdited = decision !== newest.document.decision.trim();
  const decided =
    decision === ''
      ? { decidedBy: null, decidedAt: null }
      : isEdited
        ? { decidedBy: actor.name, decidedAt: new Date() }
        : {};
  await study.update(
    { title: next.title, version, ...summaryOf(next.document), ...decided },
    { transaction },
  );
  const detail = { title: next.title, version };
  await recordActivity(
    models,
    { action: 'study.update', groupId, actor, subjectId: studyId, detail },
    transaction,
  );
}

/** What it showed stays; its links stop to open, and cards that came from it stand alone. */
export async function deleteStudy(models: Models, actor: Person, study: Study): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    await models.ShareLink.update(
      { revokedAt: new Date() },
      { where: { studyId: study.id, revokedAt: null }, transaction },
    );
    await study.destroy({ transaction });
    const { groupId, id: subjectId, title } = study;
    await recordActivity(
      models,
      { action: 'study.delete', groupId, actor, subjectId, detail: { title } },
      transaction,
    );
  });
}

const summaryOf = ({ question, items }: StudyDocument) => ({ question, itemCount: items.length });

function staleVersion(newest: StudyVersion, startedFrom: number) {
  const who = newest.author?.name ?? 'somebody whose account is gone';
  const message = `version ${newest.version} was saved by ${who} at ${newest.createdAt.toISOString()}`;
  return conflict(
    `This edit started from version ${startedFrom}, but ${message}. Load it, then make the change again.`,
    [{ path: 'version', message: `${message}; yours is ${startedFrom}` }],
  );
}

async function reload(models: Models, studyId: string): Promise<StudyWithVersion> {
  const found = await loadStudy(models, studyId);
  if (!found) throw notFound('study');
  return found;
}
