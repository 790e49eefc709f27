import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { changeStudy } from '../../policies/study.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { shareableStudy } from '../../services/links.ts';
import { answerLinks, answerNewLink } from '../links/linkAnswers.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { studyId: string } }) =>
  dependencies.models.Study.findByPk(params.studyId);

const listLinksOfStudy = route({
  method: 'get',
  path: '/studies/:studyId/links',
  summary: 'The share links of a study, newest first.',
  noun: 'study',
  policy: changeStudy,
  load,
  answer: { status: 200, schema: linkListSchema },
  handler: ({ dependencies, params }) => answerLinks(dependencies, { studyId: params.studyId }),
});

const createLinkForStudy = route({
  method: 'post',
  path: '/studies/:studyId/links',
  summary:
    'Make a link that opens the study as it is whenever it is opened, with the runs and designs in it. Only this answer carries its address.',
  noun: 'study',
  policy: changeStudy,
  body: createLinkSchema,
  load,
  answer: { status: 201, schema: createdLinkSchema },
  handler: ({ dependencies, actor, subject, body }) =>
    answerNewLink(dependencies, actor, shareableStudy(subject), body),
});

export const studyLinkRoutes: Route[] = [listLinksOfStudy, createLinkForStudy];
