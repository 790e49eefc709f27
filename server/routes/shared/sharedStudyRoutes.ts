import { designResultSchema } from '../../../shared/design.ts';
import { sharedStudySchema } from '../../../shared/study.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { notFound } from '../../errors.ts';
import { anyone } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { countLinkUse, openLink } from '../../services/links.ts';
import { sendDesignFile } from '../../services/sendDesignFile.ts';
import { sendRunFile } from '../../services/sendRunFile.ts';
import { designOfStudy, openSharedStudy, runOfStudy } from '../../services/sharedStudies.ts';
import { readingsQuerySchema } from '../runs/readingsQuery.ts';

type Context<Params> = { dependencies: AppDependencies; params: Params };

async function load({ dependencies, params }: Context<{ token: string }>) {
  const shared = await openLink(dependencies.models, params.token);
  return shared && 'study' in shared ? shared : null;
}

async function loadRunOfStudy(context: Context<{ token: string; runId: string }>) {
  const shared = await load(context);
  return shared && runOfStudy(context.dependencies.models, shared.study, context.params.runId);
}

async function loadDesignOfStudy(context: Context<{ token: string; designId: string }>) {
  const shared = await load(context);
  return shared && designOfStudy(context.dependencies.models, shared.study, context.params.designId);
}

const readSharedStudy = route({
  method: 'get',
  path: '/shared/:token/study',
  summary:
    'The study that a share link opens, as it now is, with its runs and designs; 410 once the link ended.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { status: 200, schema: sharedStudySchema },
  async handler({ dependencies, subject }) {
    const study = await openSharedStudy(dependencies.models, subject.study);
    if (!study) throw notFound('link');
    await countLinkUse(dependencies.models, subject.link);
    return study;
  },
});

const readRunData = streamRoute({
  method: 'get',
  path: '/shared/:token/runs/:runId/data',
  summary: 'The numbers of a run that the shared study shows, as Float64 columns behind a JSON header.',
  noun: 'run',
  policy: anyone,
  query: readingsQuerySchema,
  load: loadRunOfStudy,
  answer: { contentType: 'application/octet-stream' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(dependencies, subject, { kind: 'binary', readings: query.readings }, response),
});

const readRunCsv = streamRoute({
  method: 'get',
  path: '/shared/:token/runs/:runId/data.csv',
  summary: 'The numbers of a run that the shared study shows, as CSV.',
  noun: 'run',
  policy: anyone,
  query: readingsQuerySchema,
  load: loadRunOfStudy,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(dependencies, subject, { kind: 'csv', readings: query.readings }, response),
});

const readRunInput = streamRoute({
  method: 'get',
  path: '/shared/:token/runs/:runId/input.json',
  summary: 'A request of the solve contract that reproduces a run of the shared study on the command line.',
  noun: 'run',
  policy: anyone,
  load: loadRunOfStudy,
  answer: { contentType: 'application/json' },
  handler: ({ dependencies, subject, response }) =>
    sendRunFile(dependencies, subject, { kind: 'input' }, response),
});

const readDesignResult = streamRoute({
  method: 'get',
  path: '/shared/:token/designs/:designId/result',
  summary: 'The answer of a design that the shared study shows.',
  noun: 'design',
  policy: anyone,
  load: loadDesignOfStudy,
  answer: { contentType: 'application/json', schema: designResultSchema },
  handler: ({ dependencies, subject, response }) => sendDesignFile(dependencies, subject, 'result', response),
});

const readDesignCsv = streamRoute({
  method: 'get',
  path: '/shared/:token/designs/:designId/result.csv',
  summary: 'The answer of a design that the shared study shows, as CSV.',
  noun: 'design',
  policy: anyone,
  load: loadDesignOfStudy,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, response }) => sendDesignFile(dependencies, subject, 'csv', response),
});

const readDesignInput = streamRoute({
  method: 'get',
  path: '/shared/:token/designs/:designId/input.json',
  summary:
    'A request of the solve contract that reproduces a design of the shared study on the command line.',
  noun: 'design',
  policy: anyone,
  load: loadDesignOfStudy,
  answer: { contentType: 'application/json' },
  handler: ({ dependencies, subject, response }) => sendDesignFile(dependencies, subject, 'input', response),
});

export const sharedStudyRoutes: Route[] = [
  readSharedStudy,
  readRunData,
  readRunCsv,
  readRunInput,
  readDesignResult,
  readDesignCsv,
  readDesignInput,
];
