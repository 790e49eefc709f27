import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { caughtMailListSchema } from '../../../shared/account.ts';
import { issuePaths, read } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildUser, PASSWORD } from '../../../tests/factories.ts';
import type { User } from '../../models/user.ts';
import { hashSecret } from '../../services/secrets.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

type Mail = { to: string; subject: string; text: string };

async function mailsTo(email: string): Promise<Mail[]> {
  const answer = await api.anonymous().get('/api/v1/development/mails').expect(200);
  return read(caughtMailListSchema, answer).mails.filter((mail) => mail.to === email);
}

const ask = (email: string) => api.anonymous().post('/api/v1/password-resets').send({ email }).expect(202);

async function askForToken(user: User): Promise<string> {
  await ask(user.email);
  const mail = await vi.waitFor(async () => {
    const [newest] = await mailsTo(user.email);
    expect(newest).toBeDefined();
    return newest!;
  });
  const token = /http:\/\/skewlight\.test\/reset-password\/(\S+)/.exec(mail.text)?.[1];
  expect(token).toHaveLength(43);
  return token!;
}

const complete = (token: string, password = 'another long one') =>
  api.anonymous().post('/api/v1/password-resets/complete').send({ token, password });

test('a mailed link sets a new password, once, and ends every session', async () => {
  const user = await buildUser(api.models);
  const browser = await api.signedIn(user);
  const token = await askForToken(user);
  expect(await api.models.PasswordReset.count({ where: { tokenHash: token } })).toBe(0);
  expect(await api.models.PasswordReset.count({ where: { tokenHash: hashSecret(token) } })).toBe(1);
  await complete(token).expect(204);
  await browser.get('/api/v1/session').expect(401);
  const signIn = (password: string) =>
    api.anonymous().post('/api/v1/session').send({ email: user.email, password });
  await signIn(PASSWORD).expect(401);
  await signIn('another long one').expect(200);
  const again = await complete(token, 'a third long one').expect(422);
  expect(issuePaths(again)).toEqual(['token']);
  expect(await api.models.Activity.count({ where: { actorId: user.id, action: 'password.reset' } })).toBe(1);
});

test('setting a password makes the other links of that account void', async () => {
  const user = await buildUser(api.models);
  const first = await askForToken(user);
  await ask(user.email);
  await vi.waitFor(async () => expect(await mailsTo(user.email)).toHaveLength(2));
  await complete(first).expect(204);
  const open = await api.models.PasswordReset.count({ where: { userId: user.id, usedAt: null } });
  expect(open).toBe(0);
});

test('an unknown address gets the same answer and no mail', async () => {
  const unknown = 'nobody-here@films.example';
  const user = await buildUser(api.models);
  const answer = await ask(unknown);
  expect(answer.text).toBe((await ask(user.email)).text);
  await vi.waitFor(async () => expect(await mailsTo(user.email)).toHaveLength(1));
  expect(await mailsTo(unknown)).toHaveLength(0);
});

test('an old link is refused', async () => {
  const user = await buildUser(api.models);
  const token = await askForToken(user);
  await api.models.PasswordReset.update({ expiresAt: new Date(0) }, { where: { userId: user.id } });
  await complete(token).expect(422);
  await complete('never-existed').expect(422);
});

test('two uses of one link at once: one sets the password', async () => {
  const user = await buildUser(api.models);
  const token = await askForToken(user);
  const answers = await Promise.all([
    complete(token, 'the first long one'),
    complete(token, 'the second long one'),
  ]);
  expect(answers.map((answer) => answer.status).sort()).toEqual([204, 422]);
  const { sessionVersion } = await user.reload();
  expect(sessionVersion).toBe(2);
});

test('caught mails are not there in production', async () => {
  const production = await startApiServer({ production: true });
  await production.anonymous().get('/api/v1/development/mails').expect(404);
  await production.stop();
});
