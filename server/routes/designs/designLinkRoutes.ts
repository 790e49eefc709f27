import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { changeRun } from '../../policies/run.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { loadDesign } from '../../services/designs.ts';
import { shareableRun } from '../../services/links.ts';
import { answerLinks, answerNewLink } from '../links/linkAnswers.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { designId: string } }) =>
  loadDesign(dependencies.models, params.designId);

const listLinksOfDesign = route({
  method: 'get',
  path: '/designs/:designId/links',
  summary: 'The share links of a design, newest first.',
  noun: 'design',
  policy: changeRun,
  load,
  answer: { status: 200, schema: linkListSchema },
  handler: ({ dependencies, subject }) => answerLinks(dependencies, { runId: subject.id }),
});

const createLinkForDesign = route({
  method: 'post',
  path: '/designs/:designId/links',
  summary: 'Make a link that opens the design without an account. Only this answer carries its address.',
  noun: 'design',
  policy: changeRun,
  body: createLinkSchema,
  load,
  answer: { status: 201, schema: createdLinkSchema },
  handler: ({ dependencies, actor, subject, body }) =>
    answerNewLink(dependencies, actor, shareableRun(subject), body),
});

export const designLinkRoutes: Route[] = [listLinksOfDesign, createLinkForDesign];
