import { isDeepStrictEqual } from 'node:util';
import { col, Op } from 'sequelize';
import type { Includeable } from 'sequelize';
import type { StackDocument, UpdateStack } from '../../shared/stack.ts';
import { countLayers } from '../../shared/stackCase.ts';
import { conflict, invalid, notFound } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { Stack } from '../models/stack.ts';
import type { StackVersion } from '../models/stackVersion.ts';
import { checkStackDocument } from './checkStackDocument.ts';
import { pinVersions } from './pinVersions.ts';
import { recordActivity } from './recordActivity.ts';

type Person = { userId: string; name: string };
type NewStack = { name: string; description: string; document: StackDocument; isDemo?: boolean };
export type StackWithVersion = { stack: Stack; newest: StackVersion };

/** The stack and its newest version with the author; null when there is no such stack. */
export async function loadStack(models: Models, stackId: string): Promise<StackWithVersion | null> {
  const stack = await models.Stack.findByPk(stackId, { include: newestVersion() });
  return stack && withVersion(stack);
}

/** The stacks of a group, the one saved last first. Their documents are left in the database. */
export async function listStacks(models: Models, groupId: string): Promise<StackWithVersion[]> {
  const stacks = await models.Stack.findAll({
    where: { groupId },
    include: newestVersion(['document']),
    order: [
      ['updatedAt', 'DESC'],
      ['id', 'ASC'],
    ],
  });
  return stacks.map(withVersion);
}

function newestVersion(exclude: string[] = []): Includeable {
  return {
    association: 'versions',
    where: { version: { [Op.eq]: col('Stack.version') } },
    attributes: { exclude },
    include: ['author'],
  };
}

function withVersion(stack: Stack): StackWithVersion {
  const newest = stack.versions?.[0];
  if (!newest) throw new Error(`Stack ${stack.id} has no version ${stack.version}`);
  return { stack, newest };
}

/**
 * Puts a new stack into the group, as its version 1, with the version of each of its materials named.
 *
 * @throws Refusal 422 when the document is too deep or too large
 */
export async function createStack(
  models: Models,
  actor: Person,
  groupId: string,
  { name, description, document: entered, isDemo = false }: NewStack,
): Promise<StackWithVersion> {
  refuseBadDocument(entered);
  const stackId = await models.sequelize.transaction(async (transaction) => {
    const document = await pinVersions(models, groupId, entered, transaction);
    const stack = await models.Stack.create(
      { groupId, name, description, version: 1, isDemo },
      { transaction },
    );
    await models.StackVersion.create(
      {
        stackId: stack.id,
        version: 1,
        name,
        description,
        document,
        layerCount: countLayers(document.layers),
        authorId: actor.userId,
      },
      { transaction },
    );
    await recordActivity(
      models,
      { action: 'stack.create', groupId, actor, subjectId: stack.id, detail: { name } },
      transaction,
    );
    return stack.id;
  });
  return reload(models, stackId);
}

/**
 * Saves a new version over the one that the edit started from, with the version of each of its materials named.
 * The same save sent twice is one save.
 *
 * @throws Refusal 409 when somebody saved meanwhile, 422 when the document is too deep or too large
 */
export async function updateStack(
  models: Models,
  actor: Person,
  stackId: string,
  update: UpdateStack,
): Promise<StackWithVersion> {
  if (update.document) refuseBadDocument(update.document);
  await models.sequelize.transaction(async (transaction) => {
    const stack = await models.Stack.findByPk(stackId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!stack) throw notFound('stack');
    const newest = await models.StackVersion.findOne({
      where: { stackId, version: stack.version },
      include: 'author',
      transaction,
    });
    if (!newest) throw new Error(`Stack ${stackId} has no version ${stack.version}`);
    const entered = update.document ?? newest.document;
    const document = await pinVersions(models, stack.groupId, entered, transaction);
    if (update.version !== stack.version) {
      if (isSameSave(newest, update.document ? { ...update, document } : update, actor)) return;
      throw staleVersion(newest, update.version);
    }
    const next = {
      name: update.name ?? newest.name,
      description: update.description ?? newest.description,
      version: stack.version + 1,
    };
    await models.StackVersion.create(
      { ...next, stackId, document, layerCount: countLayers(document.layers), authorId: actor.userId },
      { transaction },
    );
    await stack.update(next, { transaction });
    const detail = { name: next.name, version: next.version };
    await recordActivity(
      models,
      { action: 'stack.update', groupId: stack.groupId, actor, subjectId: stackId, detail },
      transaction,
    );
  });
  return reload(models, stackId);
}

/** Runs of the stack stay: each holds what it was computed from. */
export async function deleteStack(models: Models, actor: Person, stack: Stack): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    await stack.destroy({ transaction });
    await recordActivity(
      models,
      {
        action: 'stack.delete',
        groupId: stack.groupId,
        actor,
        subjectId: stack.id,
        detail: { name: stack.name },
      },
      transaction,
    );
  });
}

function refuseBadDocument(document: StackDocument): void {
  const issues = checkStackDocument(document);
  if (issues.length > 0) throw invalid(issues);
}

/** Whether the newest version is what this person's save, sent once before, already made. */
function isSameSave(newest: StackVersion, update: UpdateStack, actor: Person): boolean {
  return (
    update.version === newest.version - 1 &&
    newest.authorId === actor.userId &&
    (update.name ?? newest.name) === newest.name &&
    (update.description ?? newest.description) === newest.description &&
    (update.document === undefined || isDeepStrictEqual(update.document, newest.document))
  );
}

function staleVersion(newest: StackVersion, startedFrom: number) {
  const who = newest.author?.name ?? 'somebody whose account is gone';
  const message = `version ${newest.version} was saved by ${who} at ${newest.createdAt.toISOString()}`;
  return conflict(
    `This edit started from version ${startedFrom}, but ${message}. Load it, then make the change again.`,
    [{ path: 'version', message: `${message}; yours is ${startedFrom}` }],
  );
}

async function reload(models: Models, stackId: string): Promise<StackWithVersion> {
  const found = await loadStack(models, stackId);
  if (!found) throw notFound('stack');
  return found;
}
