import { describe, expect, test } from 'vitest';
import { allRoutes } from './allRoutes.ts';

/**
 * Who may call what. A new route fails here until somebody has written down who may, and a changed policy until
 * somebody has agreed.
 */
const agreed: Record<string, string> = {
  'get /health': 'anyone',
  'get /openapi.json': 'anyone',
  'post /session': 'anyone',
  'get /session': 'signed in',
  'delete /session': 'signed in',
  'post /accounts': 'anyone',
  'post /password-resets': 'anyone',
  'post /password-resets/complete': 'anyone',
  'get /tokens': 'signed in (cookie only)',
  'post /tokens': 'signed in (cookie only)',
  'delete /tokens/:tokenId': 'signed in (cookie only)',
  'get /groups/:groupId/members': 'member of the group',
  'post /groups/:groupId/members': 'owner of the group',
  'patch /groups/:groupId/members/:userId': 'owner of the group',
  'delete /groups/:groupId/members/:userId': 'owner of the group, or the member themself',
  'get /groups/:groupId/links': 'owner of the group',
  'get /groups/:groupId/stacks': 'member of the group',
  'post /groups/:groupId/stacks': 'editor of the group',
  'get /stacks/:stackId': 'member of the group',
  'patch /stacks/:stackId': 'editor of the group',
  'delete /stacks/:stackId': 'editor of the group',
  'get /groups/:groupId/materials': 'member of the group',
  'get /materials/:materialId': 'member of the group; the shipped library: signed in',
  'post /groups/:groupId/materials': 'editor of the group',
  'post /groups/:groupId/materials/preview': 'member of the group',
  'patch /materials/:materialId': 'editor of the group; the shipped library: nobody',
  'delete /materials/:materialId': 'editor of the group; the shipped library: nobody',
  'get /materials/:materialId/versions': 'member of the group; the shipped library: signed in',
  'post /materials/:materialId/versions': 'editor of the group; the shipped library: nobody',
  'get /materials/:materialId/uses': 'member of the group; the shipped library: signed in',
  'get /materials/:materialId/export.csv': 'member of the group; the shipped library: signed in',
  'post /groups/:groupId/fits': 'member of the group',
  'post /groups/:groupId/imports': 'editor of the group',
  'get /imports/:importId': 'member of the group',
  'get /imports/:importId/file': 'member of the group',
  'post /imports/:importId/preview': 'member of the group',
  'delete /imports/:importId': 'editor of the group',
  'post /solve': 'signed in',
  'get /groups/:groupId/runs': 'member of the group',
  'post /runs': 'editor of the group',
  'get /runs/:runId': 'member of the group',
  'delete /runs/:runId': 'editor of the group',
  'post /runs/:runId/cancel': 'editor of the group',
  'post /runs/:runId/rerun': 'editor of the group',
  'get /runs/:runId/events': 'member of the group',
  'get /runs/:runId/data': 'member of the group',
  'get /runs/:runId/data.csv': 'member of the group',
  'get /runs/:runId/input.json': 'member of the group',
  'get /runs/:runId/links': 'editor of the group',
  'post /runs/:runId/links': 'editor of the group',
  'get /groups/:groupId/studies': 'member of the group',
  'post /groups/:groupId/studies': 'editor of the group',
  'get /studies/:studyId': 'member of the group',
  'get /studies/:studyId/versions': 'member of the group',
  'patch /studies/:studyId': 'editor of the group',
  'delete /studies/:studyId': 'editor of the group',
  'get /studies/:studyId/links': 'editor of the group',
  'post /studies/:studyId/links': 'editor of the group',
  'get /groups/:groupId/designs': 'member of the group',
  'post /designs': 'editor of the group',
  'get /designs/:designId': 'member of the group',
  'delete /designs/:designId': 'editor of the group',
  'post /designs/:designId/cancel': 'editor of the group',
  'post /designs/:designId/rerun': 'editor of the group',
  'get /designs/:designId/events': 'member of the group',
  'get /designs/:designId/result': 'member of the group',
  'get /designs/:designId/result.csv': 'member of the group',
  'get /designs/:designId/input.json': 'member of the group',
  'get /designs/:designId/links': 'editor of the group',
  'post /designs/:designId/links': 'editor of the group',
  'post /sensitivity': 'signed in',
  'post /live-curve': 'signed in',
  'post /angle-features': 'signed in',
  'get /groups/:groupId/cards': 'member of the group',
  'post /groups/:groupId/cards': 'editor of the group',
  'get /groups/:groupId/cards-in-making/:key': 'editor of the group',
  'get /cards/:cardId': 'member of the group',
  'delete /cards/:cardId': 'editor of the group',
  'get /cards/:cardId/card.pdf': 'member of the group',
  'delete /links/:linkId': 'editor of the group',
  'get /shared/:token/subject': 'anyone',
  'get /shared/:token': 'anyone',
  'get /shared/:token/data': 'anyone',
  'get /shared/:token/data.csv': 'anyone',
  'get /shared/:token/input.json': 'anyone',
  'get /shared/:token/design': 'anyone',
  'get /shared/:token/result': 'anyone',
  'get /shared/:token/result.csv': 'anyone',
  'get /shared/:token/study': 'anyone',
  'get /shared/:token/runs/:runId/data': 'anyone',
  'get /shared/:token/runs/:runId/data.csv': 'anyone',
  'get /shared/:token/runs/:runId/input.json': 'anyone',
  'get /shared/:token/designs/:designId/result': 'anyone',
  'get /shared/:token/designs/:designId/result.csv': 'anyone',
  'get /shared/:token/designs/:designId/input.json': 'anyone',
  'get /shared/:token/card': 'anyone',
  'get /shared/:token/card.pdf': 'anyone',
  'post /shared/:token/stacks': 'editor of the group',
  'get /development/mails': 'anyone',
};

describe('the route table', () => {
  test('every route has the policy that was agreed, and none is missing', () => {
    const declared = Object.fromEntries(
      allRoutes.map((route) => [`${route.method} ${route.path}`, route.who]),
    );
    expect(declared).toEqual(agreed);
  });

  test('no route is declared twice', () => {
    expect(allRoutes).toHaveLength(Object.keys(agreed).length);
  });

  test('every route that is not for anyone asks who calls', () => {
    const open = allRoutes.filter((route) => route.authentication === 'none').map((route) => route.who);
    expect(new Set(open)).toEqual(new Set(['anyone']));
  });

  test('whatever has an answer has its schema or says what kind of file it is', () => {
    for (const { answer } of allRoutes) {
      if (answer.status !== 202) expect(answer.status === 204).toBe(answer.contentType === null);
    }
  });
});
