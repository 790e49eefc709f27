import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { changeRun } from '../../policies/run.ts';
import { presentCreatedLink, presentLink } from '../../presenters/presentLink.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { loadDesign } from '../../services/designs.ts';
import { createLink, listLinks, shareableRun } from '../../services/links.ts';

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
  async handler({ dependencies, subject }) {
    const links = await listLinks(dependencies.models, { runId: subject.id });
    return { links: links.map(presentLink) };
  },
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
  async handler({ dependencies, actor, subject, body }) {
    const expiresAt = body.expiresAt ? new Date(body.expiresAt) : null;
    const wanted = { label: body.label, expiresAt };
    const { link, token } = await createLink(dependencies.models, actor, shareableRun(subject), wanted);
    return presentCreatedLink(link, token, dependencies.publicUrl());
  },
});

export const designLinkRoutes: Route[] = [listLinksOfDesign, createLinkForDesign];
