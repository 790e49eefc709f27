import { afterAll, beforeAll, expect, test } from 'vitest';
import { sessionSchema } from '../../../shared/account.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildUser } from '../../../tests/factories.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

const signUp = (body: object) => api.anonymous().post('/api/v1/accounts').send(body);

test('signing up makes an account with a personal group that it owns, and signs in', async () => {
  const browser = api.anonymous();
  const email = `New-${Date.now()}@Films.example`;
  const answer = await browser
    .post('/api/v1/accounts')
    .send({ name: '  A. Newcomer ', email, password: 'a long enough one' })
    .expect(201);
  expect(answer.body).toMatchObject({
    user: { name: 'A. Newcomer', email: email.toLowerCase(), isSiteAdministrator: false },
    groups: [{ role: 'owner', isPersonal: true, isDemo: false }],
  });
  expect((await browser.get('/api/v1/session').expect(200)).body).toEqual(answer.body);
  const session = read(sessionSchema, answer);
  const user = await api.models.User.findByPk(session.user.id, { rejectOnEmpty: true });
  expect(user.passwordHash).toMatch(/^\$argon2id\$/);
  const groupId = session.groups[0]!.groupId;
  expect(await api.models.Activity.count({ where: { groupId, action: 'account.create' } })).toBe(1);
});

test('an address has one account, and a refused sign-up leaves nothing behind', async () => {
  const user = await buildUser(api.models);
  const groups = await api.models.Group.count();
  const answer = await signUp({ name: 'X', email: user.email.toUpperCase(), password: 'a long enough one' });
  expect(answer.status).toBe(409);
  expect(issuePaths(answer)).toEqual(['email']);
  expect(refusalOf(answer).message).toContain('has an account');
  expect(await api.models.Group.count()).toBe(groups);
});

test('the same sign-up sent twice at once makes one account', async () => {
  const body = { name: 'X', email: `twice-${Date.now()}@films.example`, password: 'a long enough one' };
  const answers = await Promise.all([signUp(body), signUp(body)]);
  expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
});

test('every mistake is named with its field', async () => {
  const answer = await signUp({ name: ' ', email: 'x', password: 'short', admin: true }).expect(422);
  expect(issuePaths(answer)).toEqual(['admin', 'email', 'name', 'password']);
});
