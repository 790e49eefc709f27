import { afterAll, beforeAll, expect, test } from 'vitest';
import { createdTokenSchema, tokenListSchema } from '../../../shared/account.ts';
import { read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer, Browser } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildPeople, buildUser } from '../../../tests/factories.ts';
import { hashSecret } from '../../services/secrets.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

const createToken = async (browser: Browser) =>
  read(createdTokenSchema, await browser.post('/api/v1/tokens').send({ name: 'x' }).expect(201));

test('a token acts for its person with their roles, until it is revoked', async () => {
  const { viewer, group } = await buildPeople(api.models);
  const browser = await api.signedIn(viewer);
  const created = await browser.post('/api/v1/tokens').send({ name: 'bench script' }).expect(201);
  const { id, token, createdAt } = read(createdTokenSchema, created);
  expect(token).toMatch(/^skw_[\w-]{43}$/);
  const script = api.anonymous().set('Authorization', `Bearer ${token}`);
  await script.get(`/api/v1/groups/${group.id}/stacks`).expect(200);
  await script
    .post(`/api/v1/groups/${group.id}/members`)
    .send({ email: 'x@y.example', role: 'owner' })
    .expect(403);
  const listed = await browser.get('/api/v1/tokens').expect(200);
  const [only, ...others] = read(tokenListSchema, listed).tokens;
  expect(only).toMatchObject({ id, name: 'bench script', createdAt });
  expect(only?.lastUsedAt).not.toBeNull();
  expect(others).toEqual([]);
  await browser.delete(`/api/v1/tokens/${id}`).expect(204);
  const refused = await script.get(`/api/v1/groups/${group.id}/stacks`).expect(401);
  expect(refusalOf(refused).message).toContain('unknown or revoked');
  const actions = await api.models.Activity.findAll({ where: { actorId: viewer.id }, order: ['id'] });
  expect(actions.map((line) => line.action)).toEqual(['token.create', 'token.revoke']);
});

test('only the hash is stored', async () => {
  const user = await buildUser(api.models);
  const browser = await api.signedIn(user);
  const body = await createToken(browser);
  const row = await api.models.ApiToken.findByPk(body.id, { rejectOnEmpty: true });
  expect(row.tokenHash).toBe(hashSecret(body.token));
  expect(JSON.stringify(row.toJSON())).not.toContain(body.token);
});

test('a token cannot make, list or revoke tokens', async () => {
  const browser = await api.signedIn(await buildUser(api.models));
  const body = await createToken(browser);
  const script = api.anonymous().set('Authorization', `Bearer ${body.token}`);
  await script.post('/api/v1/tokens').send({ name: 'y' }).expect(403);
  await script.get('/api/v1/tokens').expect(403);
  await script.delete(`/api/v1/tokens/${body.id}`).expect(403);
});

test("another person's token is hidden", async () => {
  const browser = await api.signedIn(await buildUser(api.models));
  const body = await createToken(browser);
  const other = await api.signedIn(await buildUser(api.models));
  await other.delete(`/api/v1/tokens/${body.id}`).expect(404);
  expect(read(tokenListSchema, await other.get('/api/v1/tokens').expect(200)).tokens).toEqual([]);
  expect(await api.models.ApiToken.count({ where: { id: body.id } })).toBe(1);
});

test.each(['Bearer', 'Bearer  ', 'Basic eDp5', 'Bearer skw_unknown', `Bearer ${'x'.repeat(5000)}`])(
  'the header "%.30s" is refused, whatever the cookie says',
  async (header) => {
    const browser = await api.signedIn(await buildUser(api.models));
    await browser.get('/api/v1/session').set('Authorization', header).expect(401);
  },
);

test('no session, no tokens', async () => {
  await api.anonymous().get('/api/v1/tokens').expect(401);
  await api.anonymous().post('/api/v1/tokens').send({ name: 'x' }).expect(401);
});
