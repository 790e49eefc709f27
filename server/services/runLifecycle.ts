import { isDeepStrictEqual } from 'node:util';
import { Op, UniqueConstraintError, fn } from 'sequelize';
import type { CreationAttributes, Transaction } from 'sequelize';
import type { StackDocument } from '../../shared/stack.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import type { AppDependencies } from '../dependencies.ts';
import { conflict, invalid, notFound } from '../errors.ts';
import { sendRunNotice } from '../jobs/runNotices.ts';
import type { Group } from '../models/group.ts';
import type { Models } from '../models/models.ts';
import { isDesignRun } from '../models/run.ts';
import type { Run } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import { idOfKey } from './idOfKey.ts';
import { lockMaterials } from './lockMaterials.ts';
import { recordActivity } from './recordActivity.ts';
import { loadStack } from './stacks.ts';

/** What becomes of a stored calculation, be it a sweep or a design. */

type Person = { userId: string; name: string };
type QueueDependencies = Pick<AppDependencies, 'models' | 'jobs'>;
type RunValues = CreationAttributes<Run>;

/**
 * Stores a calculation that waits in the queue.
 *
 * @param idempotencyKey sent again with the same request, it gives the row of the first time
 * @returns the row with who made it
 * @throws Refusal 409 when the key was used for something else
 */
export async function storeRun(
  dependencies: QueueDependencies,
  actor: Person,
  group: Group,
  values: RunValues,
  idempotencyKey: string | null,
): Promise<Run> {
  if (idempotencyKey === null) return insertRun(dependencies, actor, 'create', values);
  const id = idOfKey(actor, group, idempotencyKey);
  try {
    return await insertRun(dependencies, actor, 'create', { ...values, id });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
  }
  const first = await reload(dependencies.models, id);
  if (first.inputSha256 !== values.inputSha256 || first.name !== values.name) {
    throw conflict(`This Idempotency-Key was used for another ${nounOf(first)}: send a new one.`);
  }
  return first;
}

/** The same input once more, with today's solver. */
export async function rerunRun(dependencies: QueueDependencies, actor: Person, run: Run): Promise<Run> {
  const { groupId, stackId, stackVersion, stackName, name, kind, total } = run;
  const { input, materials, assumptions, warnings, inputSha256 } = run;
  return insertRun(dependencies, actor, 'rerun', {
    ...{ groupId, stackId, stackVersion, stackName, name, kind, total },
    ...{ input, materials, assumptions, warnings, inputSha256 },
    solverVersion: SOLVER_VERSION,
    createdById: actor.userId,
  });
}

/**
 * Ends a run that waits or is being computed. It is over once this returns; its host, if any, drops the work.
 *
 * @throws Refusal 409 when it has come to another end before
 */
export async function cancelRun(models: Models, actor: Person, run: Run): Promise<Run> {
  await models.sequelize.transaction(async (transaction) => {
    const [count] = await models.Run.update(
      { state: 'cancelled', cancelRequestedAt: fn('now'), finishedAt: fn('now') },
      { where: { id: run.id, state: { [Op.in]: ['queued', 'running'] } }, transaction },
    );
    if (count === 0) return;
    await sendRunNotice(models.sequelize, { kind: 'stop', runId: run.id }, transaction);
    await recordRunActivity(models, actor, 'cancel', run, transaction);
  });
  const ended = await reload(models, run.id);
  if (ended.state !== 'cancelled') {
    throw conflict(`The ${nounOf(run)} is ${ended.state} already: there is nothing to cancel.`);
  }
  return ended;
}

/** Deletes a run with its numbers; its links stop to open, and a host that computes it drops the work. */
export async function deleteRun(models: Models, actor: Person, run: Run): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    await models.ShareLink.update(
      { revokedAt: fn('now') },
      { where: { runId: run.id, revokedAt: null }, transaction },
    );
    await run.destroy({ transaction });
    await sendRunNotice(models.sequelize, { kind: 'stop', runId: run.id }, transaction);
    await recordRunActivity(models, actor, 'delete', run, transaction);
  });
}

type Verb = 'create' | 'cancel' | 'rerun' | 'delete';

function nounOf(run: Run): 'run' | 'design' {
  return isDesignRun(run) ? 'design' : 'run';
}

async function insertRun(
  { models, jobs }: QueueDependencies,
  actor: Person,
  verb: Verb,
  values: RunValues,
): Promise<Run> {
  const id = await models.sequelize.transaction(async (transaction) => {
    await holdMaterials(models, values, transaction);
    const run = await models.Run.create(values, { transaction });
    await jobs.enqueue(run.id, transaction);
    await recordRunActivity(models, actor, verb, run, transaction);
    return run.id;
  });
  return reload(models, id);
}

/** @throws Refusal 409 when a material was deleted since the calculation was put together */
async function holdMaterials(
  models: Models,
  { groupId, materials }: Pick<RunValues, 'groupId' | 'materials'>,
  transaction: Transaction,
): Promise<void> {
  const ids = materials.map(({ id }) => id);
  const held = new Set((await lockMaterials(models, groupId, ids, transaction)).map(({ id }) => id));
  const gone = ids.find((id) => !held.has(id));
  if (gone !== undefined) throw conflict(`The material ${gone} was deleted meanwhile: choose another one.`);
}

async function recordRunActivity(
  models: Models,
  actor: Person,
  verb: Verb,
  run: Run,
  transaction: Transaction,
): Promise<void> {
  const { groupId, id: subjectId, name } = run;
  const action = `${nounOf(run)}.${verb}` as const;
  await recordActivity(models, { action, groupId, actor, subjectId, detail: { name } }, transaction);
}

/** The stack that the document comes from; its version only where the document is that version, unchanged. */
export async function loadNamedStack(
  models: Models,
  groupId: string,
  stackId: string | undefined,
  document: StackDocument,
): Promise<Pick<Run, 'stackId' | 'stackVersion' | 'stackName'>> {
  if (stackId === undefined) return { stackId: null, stackVersion: null, stackName: null };
  const found = isRowId(stackId) ? await loadStack(models, stackId) : null;
  if (found?.stack.groupId !== groupId) {
    throw invalid([{ path: 'stackId', message: 'there is no such stack in this group' }]);
  }
  const { stack, newest } = found;
  const unchanged = isDeepStrictEqual(newest.document, document);
  return { stackId, stackVersion: unchanged ? stack.version : null, stackName: stack.name };
}

async function reload(models: Models, runId: string): Promise<Run> {
  const run = await models.Run.findByPk(runId, { include: 'createdBy' });
  if (!run) throw notFound('run');
  return run;
}
