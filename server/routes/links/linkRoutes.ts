import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import { manageGroup } from '../../policies/group.ts';
import { changeRun } from '../../policies/run.ts';
import { revokeLink as mayRevoke } from '../../policies/shareLink.ts';
import { presentCreatedLink, presentLink } from '../../presenters/presentLink.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { createLink, listLinks, revokeLink, shareableRun } from '../../services/links.ts';
import { loadRun } from '../../services/runs.ts';

const listLinksOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/links',
  summary: 'Every share link of the group, newest first.',
  noun: 'group',
  policy: manageGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: linkListSchema },
  async handler({ dependencies, subject }) {
    const links = await listLinks(dependencies.models, { groupId: subject.id });
    return { links: links.map(presentLink) };
  },
});

const listLinksOfRun = route({
  method: 'get',
  path: '/runs/:runId/links',
  summary: 'The share links of a run, newest first.',
  noun: 'run',
  policy: changeRun,
  load: ({ dependencies, params }) => loadRun(dependencies.models, params.runId),
  answer: { status: 200, schema: linkListSchema },
  async handler({ dependencies, subject }) {
    const links = await listLinks(dependencies.models, { runId: subject.id });
    return { links: links.map(presentLink) };
  },
});

const createLinkForRun = route({
  method: 'post',
  path: '/runs/:runId/links',
  summary: 'Make a link that opens the run without an account. Only this answer carries its address.',
  noun: 'run',
  policy: changeRun,
  body: createLinkSchema,
  load: ({ dependencies, params }) => loadRun(dependencies.models, params.runId),
  answer: { status: 201, schema: createdLinkSchema },
  async handler({ dependencies, actor, subject, body }) {
    const expiresAt = body.expiresAt ? new Date(body.expiresAt) : null;
    const wanted = { label: body.label, expiresAt };
    const { link, token } = await createLink(dependencies.models, actor, shareableRun(subject), wanted);
    return presentCreatedLink(link, token, dependencies.publicUrl());
  },
});

const removeLink = route({
  method: 'delete',
  path: '/links/:linkId',
  summary: 'Revoke a link: from now on it answers 410.',
  noun: 'link',
  policy: mayRevoke,
  load: ({ dependencies, params }) => dependencies.models.ShareLink.findByPk(params.linkId),
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => revokeLink(dependencies.models, actor, subject),
});

export const linkRoutes: Route[] = [listLinksOfGroup, listLinksOfRun, createLinkForRun, removeLink];
