import { createDesignSchema, designListSchema, designSchema } from '../../../shared/design.ts';
import { runProgressSchema } from '../../../shared/run.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { changeRun, readRun } from '../../policies/run.ts';
import { presentDesign, presentDesignSummary } from '../../presenters/presentDesign.ts';
import { presentRunProgress } from '../../presenters/presentRun.ts';
import { isRowId } from '../../routing/pathParams.ts';
import { readIdempotencyKey } from '../../routing/readIdempotencyKey.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { createDesign, listDesigns, loadDesign, rerunDesign } from '../../services/designs.ts';
import { cancelRun, deleteRun } from '../../services/runLifecycle.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { designId: string } }) =>
  loadDesign(dependencies.models, params.designId);

const listDesignsOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/designs',
  summary: 'The design questions of a group, newest first; the newest 500.',
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: designListSchema },
  async handler({ dependencies, subject }) {
    const designs = await listDesigns(dependencies.models, subject.id);
    return { designs: designs.map(presentDesignSummary) };
  },
});

const createDesignInGroup = route({
  method: 'post',
  path: '/designs',
  summary:
    'Ask a design question: cap chooser, optimisation or tolerance. With an Idempotency-Key header (any text up to 200 characters) a request sent twice asks it once.',
  noun: 'group',
  policy: addToGroup,
  body: createDesignSchema,
  load: async ({ dependencies, body }) =>
    isRowId(body.groupId) ? dependencies.models.Group.findByPk(body.groupId) : null,
  answer: { status: 201, schema: designSchema },
  async handler({ dependencies, actor, subject, body, request }) {
    const key = readIdempotencyKey(request);
    return presentDesign(await createDesign(dependencies, actor, subject, body, key));
  },
});

const readDesign = route({
  method: 'get',
  path: '/designs/:designId',
  summary: 'One design with its progress and everything it rests on.',
  noun: 'design',
  policy: readRun,
  load,
  answer: { status: 200, schema: designSchema },
  handler: ({ subject }) => presentDesign(subject),
});

const removeDesign = route({
  method: 'delete',
  path: '/designs/:designId',
  summary: 'Delete a design with its answer. It is cancelled first, and its links stop to open.',
  noun: 'design',
  policy: changeRun,
  load,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteRun(dependencies.models, actor, subject),
});

const cancelDesign = route({
  method: 'post',
  path: '/designs/:designId/cancel',
  summary: 'Cancel a design that waits or is being computed.',
  noun: 'design',
  policy: changeRun,
  load,
  answer: { status: 200, schema: runProgressSchema },
  handler: async ({ dependencies, actor, subject }) =>
    presentRunProgress(await cancelRun(dependencies.models, actor, subject)),
});

const rerunDesignById = route({
  method: 'post',
  path: '/designs/:designId/rerun',
  summary: "Ask the same question once more, with today's solver.",
  noun: 'design',
  policy: changeRun,
  load,
  answer: { status: 201, schema: designSchema },
  handler: async ({ dependencies, actor, subject }) =>
    presentDesign(await rerunDesign(dependencies, actor, subject)),
});

export const designRoutes: Route[] = [
  listDesignsOfGroup,
  createDesignInGroup,
  readDesign,
  removeDesign,
  cancelDesign,
  rerunDesignById,
];
