import { createRunSchema, runListSchema, runProgressSchema, runSchema } from '../../../shared/run.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { changeRun, readRun as mayRead } from '../../policies/run.ts';
import { presentRun, presentRunProgress, presentRunSummary } from '../../presenters/presentRun.ts';
import { isRowId } from '../../routing/pathParams.ts';
import { readIdempotencyKey } from '../../routing/readIdempotencyKey.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { cancelRun, deleteRun } from '../../services/runLifecycle.ts';
import { createRun, listRuns, loadRun, rerunSweep } from '../../services/runs.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { runId: string } }) =>
  loadRun(dependencies.models, params.runId);

const listRunsOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/runs',
  summary: 'The runs of a group, newest first; the newest 500.',
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: runListSchema },
  async handler({ dependencies, subject }) {
    const runs = await listRuns(dependencies.models, subject.id);
    return { runs: runs.map(({ run, axes }) => presentRunSummary(run, axes)) };
  },
});

const createRunInGroup = route({
  method: 'post',
  path: '/runs',
  summary:
    'Start a sweep. With an Idempotency-Key header (any text up to 200 characters) a request sent twice starts one.',
  noun: 'group',
  policy: addToGroup,
  body: createRunSchema,
  load: async ({ dependencies, body }) =>
    isRowId(body.groupId) ? dependencies.models.Group.findByPk(body.groupId) : null,
  answer: { status: 201, schema: runSchema },
  async handler({ dependencies, actor, subject, body, request }) {
    const key = readIdempotencyKey(request);
    return presentRun(await createRun(dependencies, actor, subject, body, key));
  },
});

const readRun = route({
  method: 'get',
  path: '/runs/:runId',
  summary: 'One run with its progress and everything it rests on.',
  noun: 'run',
  policy: mayRead,
  load,
  answer: { status: 200, schema: runSchema },
  handler: ({ subject }) => presentRun(subject),
});

const removeRun = route({
  method: 'delete',
  path: '/runs/:runId',
  summary: 'Delete a run with its numbers. It is cancelled first, and its links stop to open.',
  noun: 'run',
  policy: changeRun,
  load,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteRun(dependencies.models, actor, subject),
});

const cancelRunById = route({
  method: 'post',
  path: '/runs/:runId/cancel',
  summary: 'Cancel a run that waits or is being computed.',
  noun: 'run',
  policy: changeRun,
  load,
  answer: { status: 200, schema: runProgressSchema },
  handler: async ({ dependencies, actor, subject }) =>
    presentRunProgress(await cancelRun(dependencies.models, actor, subject)),
});

const rerunRunById = route({
  method: 'post',
  path: '/runs/:runId/rerun',
  summary: "Start the same input once more, with today's solver.",
  noun: 'run',
  policy: changeRun,
  load,
  answer: { status: 201, schema: runSchema },
  handler: async ({ dependencies, actor, subject }) =>
    presentRun(await rerunSweep(dependencies, actor, subject)),
});

export const runRoutes: Route[] = [
  listRunsOfGroup,
  createRunInGroup,
  readRun,
  removeRun,
  cancelRunById,
  rerunRunById,
];
