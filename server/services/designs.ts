import type { z } from 'zod';
import type { createDesignSchema } from '../../shared/design.ts';
import { designKinds } from '../../shared/design.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { Group } from '../models/group.ts';
import type { Models } from '../models/models.ts';
import { isDesignRun } from '../models/run.ts';
import type { DesignRun, Run } from '../models/run.ts';
import { designNameFor } from './designNames.ts';
import { takeDesignSnapshot } from './designSnapshot.ts';
import { loadNamedStack, rerunRun, storeRun } from './runLifecycle.ts';

type Person = { userId: string; name: string };
type DesignDependencies = Pick<AppDependencies, 'models' | 'materials' | 'pool' | 'jobs'>;

/** Designs of a group that a list shows. */
const LISTED_DESIGNS = 500;

/** The design with the name of who made it; null when there is none. A sweep is none. */
export async function loadDesign(models: Models, designId: string): Promise<DesignRun | null> {
  const run = await models.Run.findByPk(designId, { include: 'createdBy' });
  return run && isDesignRun(run) ? run : null;
}

/** The newest designs of a group, newest first. Their questions stay in the database. */
export async function listDesigns(models: Models, groupId: string): Promise<DesignRun[]> {
  const runs = await models.Run.findAll({
    where: { groupId, kind: [...designKinds] },
    attributes: { exclude: ['input', 'materials', 'assumptions', 'warnings'] },
    include: 'createdBy',
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    limit: LISTED_DESIGNS,
  });
  return runs.filter(isDesignRun);
}

/**
 * Stores a design question that waits in the queue.
 *
 * @param idempotencyKey sent again with the same request, it gives the design of the first time
 * @throws Refusal 422 when it cannot be answered, 409 when the key was used for something else
 */
export async function createDesign(
  { models, materials, pool, jobs }: DesignDependencies,
  actor: Person,
  group: Group,
  { stackId, name, input }: z.output<typeof createDesignSchema>,
  idempotencyKey: string | null,
): Promise<DesignRun> {
  const stack = await loadNamedStack(models, group.id, stackId, input.document);
  const snapshot = await takeDesignSnapshot({ materials, pool }, group.id, input);
  const values = {
    ...snapshot,
    ...stack,
    groupId: group.id,
    name: name ?? designNameFor(input, snapshot.materials, stack.stackName),
    createdById: actor.userId,
  };
  return asDesign(await storeRun({ models, jobs }, actor, group, values, idempotencyKey));
}

/** The same question once more, with today's solver. */
export async function rerunDesign(
  dependencies: DesignDependencies,
  actor: Person,
  design: DesignRun,
): Promise<DesignRun> {
  return asDesign(await rerunRun(dependencies, actor, design));
}

function asDesign(run: Run): DesignRun {
  if (!isDesignRun(run)) throw new Error(`Run ${run.id} was stored as a design and is of kind ${run.kind}.`);
  return run;
}
