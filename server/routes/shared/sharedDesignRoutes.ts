import { designResultSchema, sharedDesignSchema } from '../../../shared/design.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { isDesignRun } from '../../models/run.ts';
import { anyone } from '../../policies/policy.ts';
import { presentSharedDesign } from '../../presenters/presentDesign.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { countLinkUse, openLink } from '../../services/links.ts';
import { sendDesignFile } from '../../services/sendDesignFile.ts';

async function load(context: { dependencies: AppDependencies; params: { token: string } }) {
  const shared = await openLink(context.dependencies.models, context.params.token);
  return shared && 'run' in shared && isDesignRun(shared.run)
    ? { link: shared.link, design: shared.run }
    : null;
}

const readSharedDesign = route({
  method: 'get',
  path: '/shared/:token/design',
  summary: 'The design that a share link opens; 410 once it is revoked or has expired.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { status: 200, schema: sharedDesignSchema },
  async handler({ dependencies, subject }) {
    await countLinkUse(dependencies.models, subject.link);
    return presentSharedDesign(subject.design);
  },
});

const readSharedResult = streamRoute({
  method: 'get',
  path: '/shared/:token/result',
  summary: 'The answer of the shared design.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { contentType: 'application/json', schema: designResultSchema },
  handler: ({ dependencies, subject, response }) =>
    sendDesignFile(dependencies, subject.design, 'result', response),
});

const readSharedResultCsv = streamRoute({
  method: 'get',
  path: '/shared/:token/result.csv',
  summary: 'The answer of the shared design as CSV.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, response }) =>
    sendDesignFile(dependencies, subject.design, 'csv', response),
});

export const sharedDesignRoutes: Route[] = [readSharedDesign, readSharedResult, readSharedResultCsv];
