import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { LIMITS } from '../../../shared/limits.ts';
import { stackListSchema, stackSchema } from '../../../shared/stack.ts';
import type { StackItem } from '../../../shared/stack.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import {
  buildContent,
  buildDocument,
  buildMaterial,
  buildPeople,
  buildRun,
  buildStack,
} from '../../../tests/factories.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
beforeAll(async () => (api = await startApiServer()));
beforeEach(async () => (people = await buildPeople(api.models)));
afterAll(() => api.stop());

const groupUrl = () => `/api/v1/groups/${people.group.id}/stacks`;
const stackUrl = (stack: { id: string }) => `/api/v1/stacks/${stack.id}`;
const versionsOf = (stackId: string) => api.models.StackVersion.count({ where: { stackId } });

describe('a stack', () => {
  test('is made, read, saved and deleted, and the trail tells', async () => {
    const browser = await api.signedIn(people.editor);
    const document = buildDocument();
    const made = read(
      stackSchema,
      await browser.post(groupUrl()).send({ name: 'Film', document }).expect(201),
    );
    expect(made).toMatchObject({ groupId: people.group.id, version: 1, layerCount: 3, document });
    const thicker = { ...document, layers: document.layers.slice(0, 2) };
    const saved = read(
      stackSchema,
      await browser.patch(stackUrl(made)).send({ version: 1, name: 'Film 2', document: thicker }).expect(200),
    );
    expect(saved).toMatchObject({ name: 'Film 2', version: 2, layerCount: 2, updatedBy: people.editor.name });
    expect(read(stackSchema, await browser.get(stackUrl(made)).expect(200))).toEqual(saved);
    const first = await api.models.StackVersion.findOne({ where: { stackId: made.id, version: 1 } });
    expect(first?.document).toEqual(document);
    await browser.delete(stackUrl(made)).expect(204);
    await browser.get(stackUrl(made)).expect(404);
    const trail = await api.models.Activity.findAll({ where: { groupId: people.group.id }, order: ['id'] });
    expect(trail.map((line) => [line.action, line.actorId, line.subjectId])).toEqual(
      ['stack.create', 'stack.update', 'stack.delete'].map((action) => [action, people.editor.id, made.id]),
    );
  });

  test('is stored with the version of every material, which a later version does not change', async () => {
    const browser = await api.signedIn(people.editor);
    const own = await buildMaterial(api.models, {
      group: people.group,
      contents: [buildContent(), buildContent()],
    });
    const foreign = await buildMaterial(api.models, { group: people.strangersGroup });
    const part = { material: own.id };
    const document = buildDocument({
      incident: { material: own.id },
      layers: [
        {
          id: 'block',
          repeat: 2,
          layers: [
            {
              id: 'mix',
              thicknessNm: 3,
              medium: { mixture: { model: 'bruggeman', fraction: 0.5, parts: [part, { index: 1 }] } },
              oxide: { medium: part, consumedNm: 1, expansion: 1.5 },
            },
            { id: 'old', thicknessNm: 3, medium: { material: own.id, version: 1 } },
            { id: 'foreign', thicknessNm: 3, medium: { material: foreign.id } },
          ],
        },
      ],
      substrate: part,
      backside: { thicknessNm: 5e5, exit: part },
    });
    const made = read(
      stackSchema,
      await browser.post(groupUrl()).send({ name: 'Film', document }).expect(201),
    );
    const pinned = { material: own.id, version: 2 };
    expect(made.document).toMatchObject({
      incident: pinned,
      layers: [
        {
          layers: [
            { medium: { mixture: { parts: [pinned, { index: 1 }] } }, oxide: { medium: pinned } },
            { medium: { material: own.id, version: 1 } },
            { medium: { material: foreign.id } },
          ],
        },
      ],
      substrate: pinned,
      backside: { exit: pinned },
    });
    await own.update({ version: 3 });
    // The same save sent twice is one save, although the document came without versions.
    const body = { version: 1, document };
    const saved = read(stackSchema, await browser.patch(stackUrl(made)).send(body).expect(200));
    expect(saved.document.substrate).toEqual({ material: own.id, version: 3 });
    await browser.patch(stackUrl(made)).send(body).expect(200);
    await browser.patch(stackUrl(made)).send({ version: 2, name: 'Renamed' }).expect(200);
    const read3 = read(stackSchema, await browser.get(stackUrl(made)).expect(200));
    expect([read3.version, read3.document]).toEqual([3, saved.document]);
  });

  test('is listed with its group only, the one saved last first', async () => {
    const [older, newer] = [
      await buildStack(api.models, people.group),
      await buildStack(api.models, people.group),
    ];
    await buildStack(api.models, people.strangersGroup);
    const browser = await api.signedIn(people.editor);
    await browser.patch(stackUrl(older)).send({ version: 1, name: 'Saved last' }).expect(200);
    const { stacks } = read(stackListSchema, await browser.get(groupUrl()).expect(200));
    expect(stacks.map((stack) => [stack.id, stack.version])).toEqual([
      [older.id, 2],
      [newer.id, 1],
    ]);
  });

  test('leaves its runs when it is deleted', async () => {
    const stack = await buildStack(api.models, people.group);
    const run = await buildRun(api.models, people.group, { stackId: stack.id, stackName: stack.name });
    const browser = await api.signedIn(people.editor);
    await browser.delete(stackUrl(stack)).expect(204);
    await run.reload();
    expect([run.stackId, run.stackName]).toEqual([null, stack.name]);
  });
});

describe('who may', () => {
  test('a viewer reads and changes nothing', async () => {
    const stack = await buildStack(api.models, people.group);
    const browser = await api.signedIn(people.viewer);
    await browser.get(stackUrl(stack)).expect(200);
    await browser.get(groupUrl()).expect(200);
    await browser.post(groupUrl()).send({ name: 'x', document: buildDocument() }).expect(403);
    await browser.patch(stackUrl(stack)).send({ version: 1, name: 'x' }).expect(403);
    await browser.delete(stackUrl(stack)).expect(403);
    await stack.reload();
    expect([stack.name, stack.version]).toEqual(['Pt/Co/Pt', 1]);
    expect(await api.models.Stack.count({ where: { groupId: people.group.id } })).toBe(1);
  });

  test("another group's stack looks like none", async () => {
    const stack = await buildStack(api.models, people.group);
    const browser = await api.signedIn(people.stranger);
    const hidden = await browser.get(stackUrl(stack)).expect(404);
    const unknown = await browser.get(`/api/v1/stacks/${randomUUID()}`).expect(404);
    expect(hidden.body).toEqual(unknown.body);
    await browser.patch(stackUrl(stack)).send({ version: 1, name: 'x' }).expect(404);
    await browser.delete(stackUrl(stack)).expect(404);
    await browser.get(groupUrl()).expect(404);
    await browser.post(groupUrl()).send({ name: 'x', document: buildDocument() }).expect(404);
    expect((await stack.reload()).name).toBe('Pt/Co/Pt');
  });

  test('nobody without a session', async () => {
    const stack = await buildStack(api.models, people.group);
    const anonymous = api.anonymous();
    await anonymous.get(groupUrl()).expect(401);
    await anonymous.post(groupUrl()).send({ name: 'x', document: buildDocument() }).expect(401);
    await anonymous.get(stackUrl(stack)).expect(401);
    await anonymous.patch(stackUrl(stack)).send({ version: 1 }).expect(401);
    await anonymous.delete(stackUrl(stack)).expect(401);
  });

  test.each(['1', 'x', '..%2f..', '%00', "1' OR '1'='1", '00000000-0000-0000-0000-00000000000'])(
    "the id %s is nobody's",
    async (id) => {
      const browser = await api.signedIn(people.editor);
      await browser.get(`/api/v1/stacks/${id}`).expect(404);
      await browser.get(`/api/v1/groups/${id}/stacks`).expect(404);
    },
  );
});

describe('two people who edit', () => {
  test('the second to save is told who was first, and nothing is lost', async () => {
    const stack = await buildStack(api.models, people.group);
    const [first, second] = [await api.signedIn(people.owner), await api.signedIn(people.editor)];
    await first.patch(stackUrl(stack)).send({ version: 1, name: 'First' }).expect(200);
    const refused = await second.patch(stackUrl(stack)).send({ version: 1, name: 'Second' }).expect(409);
    expect(refusalOf(refused).message).toContain(`version 2 was saved by ${people.owner.name}`);
    expect(issuePaths(refused)).toEqual(['version']);
    await stack.reload();
    expect([stack.name, stack.version, await versionsOf(stack.id)]).toEqual(['First', 2, 2]);
  });

  test('of many saves at once, one is made', async () => {
    const stack = await buildStack(api.models, people.group);
    const browser = await api.signedIn(people.editor);
    const saves = Array.from({ length: 8 }, (_, position) =>
      browser.patch(stackUrl(stack)).send({ version: 1, name: `Save ${position}` }),
    );
    const statuses = (await Promise.all(saves)).map((answer) => answer.status).sort();
    expect(statuses).toEqual([200, 409, 409, 409, 409, 409, 409, 409]);
    expect(await versionsOf(stack.id)).toBe(2);
  });

  test('the same save sent twice is one save', async () => {
    const stack = await buildStack(api.models, people.group);
    const browser = await api.signedIn(people.editor);
    const save = () =>
      browser.patch(stackUrl(stack)).send({ version: 1, name: 'Once', document: buildDocument() });
    const answers = await Promise.all([save(), save()]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
    expect(answers[0].body).toEqual(answers[1].body);
    expect(await versionsOf(stack.id)).toBe(2);
  });

  test('a version that does not exist yet is a conflict', async () => {
    const stack = await buildStack(api.models, people.group);
    const browser = await api.signedIn(people.editor);
    await browser.patch(stackUrl(stack)).send({ version: 7, name: 'x' }).expect(409);
  });
});

describe('a bad body', () => {
  const post = async (body: object | string) => {
    const browser = await api.signedIn(people.editor);
    const answer = await browser.post(groupUrl()).set('Content-Type', 'application/json').send(body);
    expect(await api.models.Stack.count({ where: { groupId: people.group.id } })).toBe(0);
    return answer;
  };
  const withLayers = (layers: StackItem[]) => ({ name: 'x', document: buildDocument({ layers }) });
  const layer = (id: string): StackItem => ({ id, medium: { index: 2 }, thicknessNm: 1 });
  const nested = (depth: number): StackItem =>
    depth === 0 ? layer('l') : { id: `b${depth}`, repeat: 1, layers: [nested(depth - 1)] };

  test('is told every mistake with its full path', async () => {
    const document = {
      ...buildDocument(),
      layers: [
        { id: 'a', medium: { index: [2, -1] }, thicknessNm: -2 },
        { id: 'a', medium: { index: 2, voigtt: 1 }, thicknessNm: 'thick' },
      ],
    };
    const answer = await post({ name: ' ', document });
    expect(answer.status).toBe(422);
    expect(issuePaths(answer)).toEqual(
      expect.arrayContaining([
        'document.layers[0].medium.index',
        'document.layers[0].thicknessNm',
        'document.layers[1].thicknessNm',
        'document.layers[1].medium.voigtt',
        'name',
      ]),
    );
  });

  test('blocks too deep, and too many layers after expansion', async () => {
    const browser = await api.signedIn(people.editor);
    await browser
      .post(groupUrl())
      .send(withLayers([nested(LIMITS.blockDepth)]))
      .expect(201);
    await api.models.Stack.destroy({ where: { groupId: people.group.id } });
    expect(issuePaths(await post(withLayers([nested(LIMITS.blockDepth + 1)])))).toEqual([
      'document.layers[0].layers[0].layers[0].layers[0].layers',
    ]);
    const inner: StackItem = { id: 'inner', repeat: 1000, layers: [layer('x')] };
    const many = await post(withLayers([{ id: 'outer', repeat: 1000, layers: [inner] }]));
    expect([many.status, ...issuePaths(many)]).toEqual([422, 'document.layers']);
  });

  test('too large is 413, in our envelope', async () => {
    const answer = await post(JSON.stringify({ name: 'x'.repeat(LIMITS.bodyBytes) }));
    expect([answer.status, refusalOf(answer).code]).toEqual([413, 'too-large']);
  });

  test.each([
    ['no JSON', '{"name": '],
    ['a number', '3'],
    ['null', 'null'],
    ['nothing', ''],
    ['nesting without end', '['.repeat(200_000) + ']'.repeat(200_000)],
    ['objects without end', '{"document":'.repeat(100_000) + '1' + '}'.repeat(100_000)],
    ['a NUL in the name', JSON.stringify({ name: 'a\0b', document: buildDocument() })],
    ['half a pair in the name', `{"name": "\\ud800", "document": ${JSON.stringify(buildDocument())}}`],
    ['a prototype', `{"__proto__": {"name": "x"}, "document": ${JSON.stringify(buildDocument())}}`],
    [
      'a number beyond doubles',
      JSON.stringify(withLayers([layer('a')])).replace('"thicknessNm":1', '"thicknessNm":1e999'),
    ],
  ])('%s is refused', async (_name, body) => {
    const answer = await post(body);
    expect(answer.status).toBe(422);
    expect(refusalOf(answer).issues).not.toHaveLength(0);
  });

  test('a name that is SQL or HTML is a name', async () => {
    const browser = await api.signedIn(people.editor);
    const name = `'); DROP TABLE stacks; -- <script>alert(1)</script>`;
    const answer = await browser.post(groupUrl()).send({ name, document: buildDocument() }).expect(201);
    expect(read(stackSchema, answer).name).toBe(name);
  });
});
