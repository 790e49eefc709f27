import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { memberListSchema, memberSchema } from '../../../shared/account.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildDocument, buildPeople, buildUser } from '../../../tests/factories.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
beforeAll(async () => (api = await startApiServer()));
beforeEach(async () => (people = await buildPeople(api.models)));
afterAll(() => api.stop());

const membersUrl = () => `/api/v1/groups/${people.group.id}/members`;
const memberUrl = (user: { id: string }) => `${membersUrl()}/${user.id}`;
const roleOf = async (userId: string) =>
  (await api.models.Membership.findOne({ where: { userId, groupId: people.group.id } }))?.role;

describe('who may', () => {
  test('every member sees the members', async () => {
    const browser = await api.signedIn(people.viewer);
    const { members } = read(memberListSchema, await browser.get(membersUrl()).expect(200));
    expect(members.map((member) => member.role)).toEqual(['owner', 'editor', 'viewer']);
  });

  test.each(['editor', 'viewer'] as const)('an %s cannot decide on members', async (role) => {
    const browser = await api.signedIn(people[role]);
    const newcomer = await buildUser(api.models);
    await browser.post(membersUrl()).send({ email: newcomer.email, role: 'viewer' }).expect(403);
    await browser.patch(memberUrl(people[role])).send({ role: 'owner' }).expect(403);
    await browser.delete(memberUrl(people.owner)).expect(403);
    expect(await roleOf(people[role].id)).toBe(role);
  });

  test('somebody outside finds nothing', async () => {
    const browser = await api.signedIn(people.stranger);
    await browser.get(membersUrl()).expect(404);
    await browser.post(membersUrl()).send({ email: people.stranger.email, role: 'owner' }).expect(404);
    await browser.patch(memberUrl(people.viewer)).send({ role: 'owner' }).expect(404);
    await browser.delete(memberUrl(people.stranger)).expect(404);
    await browser.get(`/api/v1/groups/${randomUUID()}/members`).expect(404);
  });

  test('nobody without a session', async () => {
    await api.anonymous().get(membersUrl()).expect(401);
    await api.anonymous().delete(memberUrl(people.viewer)).expect(401);
  });
});

describe('an owner', () => {
  test('takes in, promotes and removes, and the trail tells', async () => {
    const browser = await api.signedIn(people.owner);
    const newcomer = await buildUser(api.models);
    const added = await browser
      .post(membersUrl())
      .send({ email: newcomer.email, role: 'viewer' })
      .expect(201);
    expect(added.body).toMatchObject({ userId: newcomer.id, name: newcomer.name, role: 'viewer' });
    const changed = await browser.patch(memberUrl(newcomer)).send({ role: 'editor' }).expect(200);
    expect(read(memberSchema, changed).role).toBe('editor');
    await browser.delete(memberUrl(newcomer)).expect(204);
    expect(await roleOf(newcomer.id)).toBeUndefined();
    const trail = await api.models.Activity.findAll({ where: { groupId: people.group.id }, order: ['id'] });
    expect(trail.map((line) => [line.action, line.actorName, line.subjectId])).toEqual([
      ['member.add', people.owner.name, newcomer.id],
      ['member.change-role', people.owner.name, newcomer.id],
      ['member.remove', people.owner.name, newcomer.id],
    ]);
  });

  test('is told at the field when nobody has the address, or they are in already', async () => {
    const browser = await api.signedIn(people.owner);
    const unknown = await browser.post(membersUrl()).send({ email: 'nobody@films.example', role: 'viewer' });
    expect([unknown.status, ...issuePaths(unknown)]).toEqual([404, 'email']);
    const twice = await browser.post(membersUrl()).send({ email: people.viewer.email, role: 'editor' });
    expect([twice.status, ...issuePaths(twice)]).toEqual([409, 'email']);
    expect(await roleOf(people.viewer.id)).toBe('viewer');
  });

  test('finds no member who is none', async () => {
    const browser = await api.signedIn(people.owner);
    await browser.patch(memberUrl(people.stranger)).send({ role: 'editor' }).expect(404);
    await browser.delete(memberUrl(people.stranger)).expect(404);
  });

  test('stays when the last one', async () => {
    const browser = await api.signedIn(people.owner);
    await browser.patch(memberUrl(people.owner)).send({ role: 'editor' }).expect(409);
    const refused = await browser.delete(memberUrl(people.owner)).expect(409);
    expect(refusalOf(refused).message).toContain('last owner');
    expect(await roleOf(people.owner.id)).toBe('owner');
  });

  test('of two who leave at once, one stays', async () => {
    const first = await api.signedIn(people.owner);
    await first.patch(memberUrl(people.editor)).send({ role: 'owner' }).expect(200);
    const second = await api.signedIn(people.editor);
    const answers = await Promise.all([
      first.delete(memberUrl(people.owner)),
      second.delete(memberUrl(people.editor)),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([204, 409]);
  });
});

test('a member may leave, and a change of role holds from the next request', async () => {
  const owner = await api.signedIn(people.owner);
  const editor = await api.signedIn(people.editor);
  const newStack = () =>
    editor
      .post(`/api/v1/groups/${people.group.id}/stacks`)
      .send({ name: 'Stack', document: buildDocument() });
  await newStack().expect(201);
  await owner.patch(memberUrl(people.editor)).send({ role: 'viewer' }).expect(200);
  await newStack().expect(403);
  const viewer = await api.signedIn(people.viewer);
  await viewer.delete(memberUrl(people.viewer)).expect(204);
  await viewer.get(membersUrl()).expect(404);
});
