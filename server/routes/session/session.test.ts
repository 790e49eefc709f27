import jwt from 'jsonwebtoken';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { issuePaths, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildGroup, buildUser, PASSWORD } from '../../../tests/factories.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

const signIn = (email: string, password = PASSWORD) =>
  api.anonymous().post('/api/v1/session').send({ email, password });

describe('signing in and out', () => {
  test('a session lasts from sign-in to sign-out, in an HttpOnly SameSite cookie', async () => {
    const user = await buildUser(api.models);
    const group = await buildGroup(api.models, [[user, 'editor']]);
    const browser = api.anonymous();
    const signedIn = await browser.post('/api/v1/session').send({ email: user.email, password: PASSWORD });
    expect(signedIn.status).toBe(200);
    expect(signedIn.get('Set-Cookie')?.[0]).toMatch(/^skewlight_session=.*HttpOnly; SameSite=Lax$/);
    expect(signedIn.body).toMatchObject({
      user: { id: user.id, email: user.email },
      groups: [{ groupId: group.id, role: 'editor' }],
    });
    const session = await browser.get('/api/v1/session').expect(200);
    expect(session.body).toEqual(signedIn.body);
    await browser.delete('/api/v1/session').expect(204);
    await browser.get('/api/v1/session').expect(401);
  });

  test('the address may be typed in any case', async () => {
    const user = await buildUser(api.models);
    await signIn(user.email.toUpperCase()).expect(200);
  });

  test('a wrong password and an unknown address get the same answer', async () => {
    const user = await buildUser(api.models);
    const wrong = await signIn(user.email, 'not the password').expect(401);
    const unknown = await signIn('nobody@films.example', 'not the password').expect(401);
    expect(unknown.body).toEqual(wrong.body);
    expect(wrong.get('Set-Cookie')).toBeUndefined();
  });

  test('every mistake of the form is named at once', async () => {
    const answer = await api
      .anonymous()
      .post('/api/v1/session')
      .send({ email: 'x', passwort: 'y' })
      .expect(422);
    expect(issuePaths(answer)).toEqual(['email', 'password', 'passwort']);
  });

  test('in production the cookie is Secure and demo accounts are refused', async () => {
    const production = await startApiServer({ production: true });
    try {
      const demo = await buildUser(api.models, { isDemo: true });
      const user = await buildUser(api.models);
      const post = (email: string) =>
        production.anonymous().post('/api/v1/session').send({ email, password: PASSWORD });
      const refused = await post(demo.email).expect(401);
      const unknown = await post('nobody@films.example').expect(401);
      expect(refused.body).toEqual(unknown.body);
      expect((await post(user.email).expect(200)).get('Set-Cookie')?.[0]).toContain('; Secure');
      await signIn(demo.email).expect(200);
    } finally {
      await production.stop();
    }
  });

  test('guessing is slowed down, for this person and not for others', async () => {
    const strict = await startApiServer({ attemptLimit: 3 });
    try {
      const [user, other] = [await buildUser(strict.models), await buildUser(strict.models)];
      const attempt = (email: string, password: string) =>
        strict.anonymous().post('/api/v1/session').send({ email, password });
      for (let count = 0; count < 3; count++) await attempt(user.email, 'wrong').expect(401);
      const refused = await attempt(user.email, PASSWORD).expect(429);
      expect(refusalOf(refused).code).toBe('too-many-requests');
      await attempt(other.email, PASSWORD).expect(200);
    } finally {
      await strict.stop();
    }
  });
});

describe('a cookie that does not hold', () => {
  const withCookie = (token: string) =>
    api.anonymous().get('/api/v1/session').set('Cookie', `skewlight_session=${token}`);

  test.each([
    ['nonsense', () => 'nonsense'],
    ['signed by somebody else', (id: string) => jwt.sign({ generation: 1 }, 'x'.repeat(32), { subject: id })],
    ['not signed', (id: string) => jwt.sign({ generation: 1 }, '', { subject: id, algorithm: 'none' })],
    [
      'too old',
      (id: string) =>
        jwt.sign({ generation: 1 }, api.dependencies.config.sessionSecret, { subject: id, expiresIn: -1 }),
    ],
    [
      'of an earlier generation',
      (id: string) => jwt.sign({ generation: 0 }, api.dependencies.config.sessionSecret, { subject: id }),
    ],
    [
      'without a generation',
      (id: string) => jwt.sign({}, api.dependencies.config.sessionSecret, { subject: id }),
    ],
  ])('%s is the same as none', async (_name, tokenOf) => {
    const user = await buildUser(api.models);
    await withCookie(tokenOf(user.id)).expect(401);
  });

  test('the same token, signed by us and of this generation, holds', async () => {
    const user = await buildUser(api.models);
    const secret = api.dependencies.config.sessionSecret;
    await withCookie(jwt.sign({ generation: 1 }, secret, { subject: user.id })).expect(200);
  });
});

describe('requests that another site makes the browser send', () => {
  test.each([
    ['a foreign origin', { Origin: 'https://evil.example' }],
    ['an opaque origin', { Origin: 'null' }],
    ['a cross-site fetch', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a sibling host', { 'Sec-Fetch-Site': 'same-site' }],
    ['a form', { 'Content-Type': 'application/x-www-form-urlencoded' }],
    ['plain text', { 'Content-Type': 'text/plain' }],
  ])('%s is refused', async (_name, headers) => {
    const user = await buildUser(api.models);
    const browser = await api.signedIn(user);
    const answer = await browser.post('/api/v1/tokens').set(headers).send('{"name":"stolen"}').expect(403);
    expect(refusalOf(answer).code).toBe('forbidden');
    expect(await api.models.ApiToken.count({ where: { userId: user.id } })).toBe(0);
  });

  test('our own page is not', async () => {
    const browser = await api.signedIn(await buildUser(api.models));
    const headers = { Origin: 'http://skewlight.test', 'Sec-Fetch-Site': 'same-origin' };
    await browser.post('/api/v1/tokens').set(headers).send({ name: 'mine' }).expect(201);
  });
});
