import { openInGroupSchema, sharedSubjectSchema } from '../../../shared/link.ts';
import { sharedRunSchema } from '../../../shared/run.ts';
import { stackSchema } from '../../../shared/stack.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { isDesignRun, isSweepRun } from '../../models/run.ts';
import { addToGroup } from '../../policies/group.ts';
import { anyone } from '../../policies/policy.ts';
import { presentSharedRun } from '../../presenters/presentRun.ts';
import { presentStack } from '../../presenters/presentStack.ts';
import { isRowId } from '../../routing/pathParams.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { countLinkUse, openLink } from '../../services/links.ts';
import { openSharedRun } from '../../services/openSharedRun.ts';
import { sendDesignFile } from '../../services/sendDesignFile.ts';
import { sendRunFile } from '../../services/sendRunFile.ts';
import { readingsQuerySchema } from '../runs/readingsQuery.ts';

/** What a link opens is the run as it was stored: nothing here looks at the stack or the materials of today. */
async function load(context: { dependencies: AppDependencies; params: { token: string } }) {
  const shared = await openLink(context.dependencies.models, context.params.token);
  return shared && 'run' in shared && isSweepRun(shared.run) ? { link: shared.link, run: shared.run } : null;
}

const readSubject = route({
  method: 'get',
  path: '/shared/:token/subject',
  summary: 'What a share link opens: a run, a design, a study or a growth card.',
  noun: 'link',
  policy: anyone,
  load: ({ dependencies, params }) => openLink(dependencies.models, params.token),
  answer: { status: 200, schema: sharedSubjectSchema },
  handler: ({ subject }) => ({ opens: subject.opens }),
});

const readSharedRun = route({
  method: 'get',
  path: '/shared/:token',
  summary: 'The run that a share link opens; 410 once it is revoked or has expired.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { status: 200, schema: sharedRunSchema },
  async handler({ dependencies, subject }) {
    await countLinkUse(dependencies.models, subject.link);
    return presentSharedRun(subject.run);
  },
});

const readSharedData = streamRoute({
  method: 'get',
  path: '/shared/:token/data',
  summary: 'The numbers of the shared run as Float64 columns behind a JSON header.',
  noun: 'link',
  policy: anyone,
  query: readingsQuerySchema,
  load,
  answer: { contentType: 'application/octet-stream' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(dependencies, subject.run, { kind: 'binary', readings: query.readings }, response),
});

const readSharedCsv = streamRoute({
  method: 'get',
  path: '/shared/:token/data.csv',
  summary: 'The numbers of the shared run as CSV.',
  noun: 'link',
  policy: anyone,
  query: readingsQuerySchema,
  load,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(dependencies, subject.run, { kind: 'csv', readings: query.readings }, response),
});

const readSharedInput = streamRoute({
  method: 'get',
  path: '/shared/:token/input.json',
  summary: 'A request of the solve contract that reproduces the shared run or design on the command line.',
  noun: 'link',
  policy: anyone,
  async load({ dependencies, params }) {
    const shared = await openLink(dependencies.models, params.token);
    return shared && 'run' in shared ? shared.run : null;
  },
  answer: { contentType: 'application/json' },
  async handler({ dependencies, subject, response }) {
    if (isDesignRun(subject)) await sendDesignFile(dependencies, subject, 'input', response);
    else if (isSweepRun(subject)) await sendRunFile(dependencies, subject, { kind: 'input' }, response);
  },
});

const openInGroup = route({
  method: 'post',
  path: '/shared/:token/stacks',
  summary: "Put the stack of the shared run, or the film of the shared design, into a group of one's own.",
  noun: 'link or group',
  policy: addToGroup,
  body: openInGroupSchema,
  async load(context) {
    const shared = await openLink(context.dependencies.models, context.params.token);
    const { groupId } = context.body;
    if (!shared || !('run' in shared) || !isRowId(groupId)) return null;
    const { run } = shared;
    if (!isSweepRun(run) && !isDesignRun(run)) return null;
    const group = await context.dependencies.models.Group.findByPk(groupId);
    return group && { id: group.id, run };
  },
  answer: { status: 201, schema: stackSchema },
  async handler({ dependencies, actor, subject }) {
    const { stack, newest } = await openSharedRun(dependencies, actor, subject.run, subject.id);
    return presentStack(stack, newest);
  },
});

export const sharedRoutes: Route[] = [
  readSubject,
  readSharedRun,
  readSharedData,
  readSharedCsv,
  readSharedInput,
  openInGroup,
];
