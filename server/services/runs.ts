import { literal } from 'sequelize';
import { usualReadings } from '../../shared/run.ts';
import type { CreateRun, ReadingName, SweepAxes, SweepAxis } from '../../shared/run.ts';
import { LIMITS } from '../../shared/limits.ts';
import { axisFields } from '../../shared/runAxes.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { Group } from '../models/group.ts';
import type { Models } from '../models/models.ts';
import { isSweepRun } from '../models/run.ts';
import type { Run, SweepRun } from '../models/run.ts';
import { loadNamedStack, rerunRun, storeRun } from './runLifecycle.ts';
import { runNameFor } from './runNames.ts';
import { takeRunSnapshot } from './runSnapshot.ts';

type Person = { userId: string; name: string };
type RunDependencies = Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'jobs'>;
export type ListedRun = { run: SweepRun; axes: SweepAxes };

/** A map stores fewer when nobody says. */
const USUAL_MAP_READINGS: ReadingName[] = usualReadings.slice(0, LIMITS.mapReadings);

/** Runs of a group that a list shows. */
const LISTED_RUNS = 500;

/** The sweep with the name of who made it; null when there is none. A design is none. */
export async function loadRun(models: Models, runId: string): Promise<SweepRun | null> {
  const run = await models.Run.findByPk(runId, { include: 'createdBy' });
  return run && isSweepRun(run) ? run : null;
}

/** The newest runs of a group, newest first. Their documents stay in the database. */
export async function listRuns(models: Models, groupId: string): Promise<ListedRun[]> {
  const runs = await models.Run.findAll({
    where: { groupId, kind: 'sweep' },
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
  return runs.filter(isSweepRun).map((run) => ({ run, axes: listedAxes(run) }));
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
): Promise<SweepRun> {
  const stack = await loadNamedStack(models, group.id, wanted.stackId, wanted.document);
  const usual = wanted.second ? USUAL_MAP_READINGS : usualReadings;
  const readings = [...new Set(wanted.readings ?? usual)];
  const snapshot = await takeRunSnapshot({ materials, pool }, group.id, { ...wanted, readings });
  const values = {
    ...snapshot,
    ...stack,
    groupId: group.id,
    name: wanted.name ?? runNameFor(wanted, wanted.document, snapshot.materials, stack.stackName),
    createdById: actor.userId,
  };
  return asSweep(await storeRun({ models, jobs }, actor, group, values, idempotencyKey));
}

/** The same input once more, with today's solver. */
export async function rerunSweep(
  dependencies: RunDependencies,
  actor: Person,
  run: SweepRun,
): Promise<SweepRun> {
  return asSweep(await rerunRun(dependencies, actor, run));
}

function asSweep(run: Run): SweepRun {
  if (!isSweepRun(run)) throw new Error(`Run ${run.id} was stored as a sweep and is of kind ${run.kind}.`);
  return run;
}
