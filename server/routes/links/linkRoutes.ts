import { createdLinkSchema, createLinkSchema, linkListSchema } from '../../../shared/link.ts';
import { manageGroup } from '../../policies/group.ts';
import { changeRun } from '../../policies/run.ts';
import { revokeLink as mayRevoke } from '../../policies/shareLink.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { revokeLink, shareableRun } from '../../services/links.ts';
import { loadRun } from '../../services/runs.ts';
import { answerLinks, answerNewLink } from './linkAnswers.ts';

const listLinksOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/links',
  summary: 'Every share link of the group, newest first.',
  noun: 'group',
  policy: manageGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: linkListSchema },
  handler: ({ dependencies, subject }) => answerLinks(dependencies, { groupId: subject.id }),
});

const listLinksOfRun = route({
  method: 'get',
  path: '/runs/:runId/links',
  summary: 'The share links of a run, newest first.',
  noun: 'run',
  policy: changeRun,
  load: ({ dependencies, params }) => loadRun(dependencies.models, params.runId),
  answer: { status: 200, schema: linkListSchema },
  handler: ({ dependencies, subject }) => answerLinks(dependencies, { runId: subject.id }),
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
  handler: ({ dependencies, actor, subject, body }) =>
    answerNewLink(dependencies, actor, shareableRun(subject), body),
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
