import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { changeStudy } from '../../policies/study.ts';
import { presentCreatedLink, presentLink } from '../../presenters/presentLink.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { createLink, listLinks, shareableStudy } from '../../services/links.ts';

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
  async handler({ dependencies, params }) {
    const links = await listLinks(dependencies.models, { studyId: params.studyId });
    return { links: links.map(presentLink) };
  },
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
  async handler({ dependencies, actor, subject, body }) {
    const expiresAt = body.expiresAt ? new Date(body.expiresAt) : null;
    const wanted = { label: body.label, expiresAt };
    const { link, token } = await createLink(dependencies.models, actor, shareableStudy(subject), wanted);
    return presentCreatedLink(link, token, dependencies.publicUrl());
  },
});

export const studyLinkRoutes: Route[] = [listLinksOfStudy, createLinkForStudy];
