import { createHash } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import { Op, UniqueConstraintError, fn, literal } from 'sequelize';
import type { CreationAttributes, Transaction } from 'sequelize';
import type { CreateRun, ReadingName, SweepAxes, SweepAxis } from '../../shared/run.ts';
import { LIMITS } from '../../shared/limits.ts';
import { axisFields } from '../../shared/runAxes.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import type { AppDependencies } from '../dependencies.ts';
import { conflict, invalid, notFound } from '../errors.ts';
import { sendRunNotice } from '../jobs/runNotices.ts';
import type { Group } from '../models/group.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { isRowId } from '../routing/pathParams.ts';
import { recordActivity } from './recordActivity.ts';
import type { ActivityAction } from './recordActivity.ts';
import { runNameFor } from './runNames.ts';
import { takeRunSnapshot } from './runSnapshot.ts';
import { loadStack } from './stacks.ts';

type Person = { userId: string; name: string };
type RunDependencies = Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'jobs'>;
export type ListedRun = { run: Run; axes: SweepAxes };

/** What is stored when nobody says: everything that the stack page draws. */
const USUAL_READINGS: ReadingName[] = [
  'rotationP',
  'ellipticityP',
  'rotationS',
  'ellipticityS',
  'reflectanceP',
  'reflectanceS',
  'crossSp',
  'crossPs',
  'contrastP',
  'contrastS',
];

/** ... and of a map, which stores fewer. */
const USUAL_MAP_READINGS: ReadingName[] = USUAL_READINGS.slice(0, LIMITS.mapReadings);

/** Runs of a group that a list shows. */
const LISTED_RUNS = 500;

/** The run with the name of who made it; null when there is none. */
export function loadRun(models: Models, runId: string): Promise<Run | null> {
  return models.Run.findByPk(runId, { include: 'createdBy' });
}

/** The newest runs of a group, newest first. Their documents stay in the database. */
export async function listRuns(models: Models, groupId: string): Promise<ListedRun[]> {
  const runs = await models.Run.findAll({
    where: { groupId },
    attributes: {
      exclude: ['input', 'materials', 'assumptions', 'warnings'],
      include: axisFields.map((field) => [literal(`"Run"."input"->'${field}'`), field]),
    },
    include: 'createdBy',
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    limit: LISTED_RUNS,
  });
  return runs.map((run) => ({ run, axes: listedAxes(run) }));
}

/** The axes that `listRuns` cut out of the input. */
function listedAxes(run: Run): SweepAxes {
  const [axis, second, family] = axisFields.map((field) => run.get(field) as SweepAxis | null);
  return { axis: axis!, ...(second && { second }), ...(family && { family }) };
}

/**
 * Stores a run that waits in the queue.
 *
 * @param idempotencyKey sent again with the same request, it gives the run of the first time
 * @throws Refusal 422 when it cannot be computed, 409 when the key was used for something else
 */
export async function createRun(
  { models, materials, pool, jobs }: RunDependencies,
  actor: Person,
  group: Group,
  wanted: CreateRun,
  idempotencyKey: string | null,
): Promise<Run> {
  const stack = await loadNamedStack(models, group.id, wanted.stackId, wanted.document);
  const usual = wanted.second ? USUAL_MAP_READINGS : USUAL_READINGS;
  const readings = [...new Set(wanted.readings ?? usual)];
  const snapshot = await takeRunSnapshot({ materials, pool }, group.id, { ...wanted, readings });
  const values = {
    ...snapshot,
    ...stack,
    groupId: group.id,
    name: wanted.name ?? runNameFor(wanted, wanted.document, snapshot.materials, stack.stackName),
    createdById: actor.userId,
  };
  if (idempotencyKey === null) return storeRun({ models, jobs }, actor, 'run.create', values);
  const id = idOfKey(actor, group, idempotencyKey);
  try {
    return await storeRun({ models, jobs }, actor, 'run.create', { ...values, id });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
  }
  const first = await reload(models, id);
  if (first.inputSha256 !== snapshot.inputSha256 || first.name !== values.name) {
    throw conflict('This Idempotency-Key was used for another run: send a new one.');
  }
  return first;
}

/** The same input once more, with today's solver. */
export async function rerunRun({ models, jobs }: RunDependencies, actor: Person, run: Run): Promise<Run> {
  const { groupId, stackId, stackVersion, stackName, name, total } = run;
  const { input, materials, assumptions, warnings, inputSha256 } = run;
  return storeRun({ models, jobs }, actor, 'run.rerun', {
    ...{ groupId, stackId, stackVersion, stackName, name, total },
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
    await recordRunActivity(models, actor, 'run.cancel', run, transaction);
  });
  const ended = await reload(models, run.id);
  if (ended.state !== 'cancelled') {
    throw conflict(`The run is ${ended.state} already: there is nothing to cancel.`);
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
    await recordRunActivity(models, actor, 'run.delete', run, transaction);
  });
}

type RunValues = CreationAttributes<Run>;

async function storeRun(
  { models, jobs }: Pick<RunDependencies, 'models' | 'jobs'>,
  actor: Person,
  action: ActivityAction,
  values: RunValues,
): Promise<Run> {
  const id = await models.sequelize.transaction(async (transaction) => {
    const run = await models.Run.create(values, { transaction });
    await jobs.enqueue(run.id, transaction);
    await recordRunActivity(models, actor, action, run, transaction);
    return run.id;
  });
  return reload(models, id);
}

async function recordRunActivity(
  models: Models,
  actor: Person,
  action: ActivityAction,
  run: Run,
  transaction: Transaction,
): Promise<void> {
  const { groupId, id: subjectId, name } = run;
  await recordActivity(models, { action, groupId, actor, subjectId, detail: { name } }, transaction);
}

/** The stack that the document comes from; its version only where the document is that version, unchanged. */
async function loadNamedStack(
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

/** A row id that follows from who asks and the key: the database itself then refuses the second row. */
function idOfKey(actor: Person, group: Group, key: string): string {
  const bytes = createHash('sha256').update(`${actor.userId}\n${group.id}\n${key}`).digest().subarray(0, 16);
  // Version 8 and the variant of RFC 9562: a UUID made by a rule of one's own.
  bytes[6] = (bytes[6]! & 0x0f) | 0x80;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  return bytes.toString('hex').replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5');
}

async function reload(models: Models, runId: string): Promise<Run> {
  const run = await loadRun(models, runId);
  if (!run) throw notFound('run');
  return run;
}
