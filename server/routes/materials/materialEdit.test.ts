import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { materialSchema } from '../../../shared/material.ts';
import type { Material } from '../../../shared/material.ts';
import { materialUsesSchema, materialVersionListSchema } from '../../../shared/materialEdit.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import {
  buildContent,
  buildDocument,
  buildMaterial,
  buildPeople,
  buildStack,
} from '../../../tests/factories.ts';
import { runCalls } from '../../../tests/runCalls.ts';
import { pinVersions } from '../../services/pinVersions.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let editor: TestAgent;
beforeAll(async () => {
  api = await startApiServer();
  people = await buildPeople(api.models);
  editor = await api.signedIn(people.editor);
  await api.dependencies.pool.warm();
}, 90_000);
afterAll(() => api.stop());

const naming = { name: 'Cobalt, ours', formula: 'Co', class: 'magnet' };
const address = () => `/api/v1/groups/${people.group.id}/materials`;
const create = async (content: object = buildContent()): Promise<Material> =>
  read(
    materialSchema,
    await editor
      .post(address())
      .send({ ...naming, content })
      .expect(201),
  );
const changed = () =>
  buildContent({
    index: { kind: 'table', wavelengthsNm: [400, 600, 800, 900], n: [2, 2.3, 2.4, 2.5], k: [3, 3.5, 4, 4] },
  });

test('a material is made once however often it is sent, by an editor of the group only', async () => {
  const body = { ...naming, content: buildContent() };
  const send = () => editor.post(address()).set('Idempotency-Key', 'once').send(body).expect(201);
  const [first, second] = await Promise.all([send(), send()]);
  const made = read(materialSchema, first);
  expect(read(materialSchema, second).id).toBe(made.id);
  expect(made).toMatchObject({ version: 1, author: people.editor.name, groupId: people.group.id });
  expect(made.id).toMatch(/^cobalt-ours-[0-9a-f]{10}$/);
  await (await api.signedIn(people.viewer)).post(address()).send(body).expect(403);
  await (await api.signedIn(people.stranger)).post(address()).send(body).expect(404);
});

test('an edit is a new version with its author and what changed; a stale or equal one is none', async () => {
  const { id } = await create();
  const versions = `/api/v1/materials/${id}/versions`;
  const body = { version: 1, note: 'measured again', content: changed() };
  expect(read(materialSchema, await editor.post(versions).send(body).expect(201)).version).toBe(2);
  expect(read(materialSchema, await editor.post(versions).send(body).expect(201)).version).toBe(2);
  const stale = await editor
    .post(versions)
    .send({ ...body, content: buildContent() })
    .expect(409);
  expect(issuePaths(stale)).toEqual(['version']);
  const [newest, oldest] = read(materialVersionListSchema, await editor.get(versions).expect(200)).versions;
  expect(newest).toMatchObject({ version: 2, author: people.editor.name, note: 'measured again' });
  expect(newest?.changes).toEqual([
    "N and k: of the table's points 1 changed, 1 added; 4 now.",
    'N and k known from 400 to 900 nm, before from 400 to 800 nm.',
  ]);
  expect(oldest).toMatchObject({ version: 1, changes: [] });
});

test('nobody changes the shipped library', async () => {
  const { id } = await buildMaterial(api.models);
  const answer = await editor.patch(`/api/v1/materials/${id}`).send({ name: 'Mine' }).expect(403);
  expect(refusalOf(answer).message).toContain('Copy the material into your group');
  await editor.delete(`/api/v1/materials/${id}`).expect(403);
  await editor.post(`/api/v1/materials/${id}/versions`).send({ version: 1, content: changed() }).expect(403);
});

test('what is in use stays, and who uses it is named', async () => {
  const { id } = await create();
  const oxide = { medium: { material: id, version: 1 }, consumedNm: 1, expansion: 1.5 };
  const layer = { id: 'film', medium: { index: 2 }, thicknessNm: 5, oxide };
  const document = buildDocument({ layers: [layer] });
  const stack = await buildStack(api.models, people.group, { name: 'Oxidized', document });
  const mixture = { kind: 'mixture of', model: 'bruggeman', fraction: 0.5 };
  const parts = [
    { material: id, version: 1 },
    { material: id, version: 1 },
  ];
  const mixed = await create({ ...buildContent(), index: { ...mixture, parts }, voigt: { kind: 'mixture' } });
  const uses = read(materialUsesSchema, await editor.get(`/api/v1/materials/${id}/uses`).expect(200));
  expect(uses).toEqual({
    stacks: [{ id: stack.id, name: 'Oxidized', versions: [1] }],
    runs: [],
    designs: [],
    materials: [{ id: mixed.id, name: mixed.name, versions: [1] }],
  });
  const refused = await editor.delete(`/api/v1/materials/${id}`).expect(409);
  expect(issuePaths(refused)).toEqual(['materials[0]', 'stacks[0]']);
  await editor.delete(`/api/v1/materials/${mixed.id}`).expect(204);
  await stack.destroy();
  await editor.delete(`/api/v1/materials/${id}`).expect(204);
  await editor.get(`/api/v1/materials/${id}`).expect(404);
});

test('a deletion waits for a stack that is being stored, and then finds it', async () => {
  const { id } = await create();
  const document = buildDocument({ substrate: { material: id } });
  const stored = await api.models.sequelize.transaction(async (transaction) => {
    // What storing a stack does first.
    await pinVersions(api.models, people.group.id, document, transaction);
    const deletion = editor.delete(`/api/v1/materials/${id}`).then((answer) => answer);
    const soon = await Promise.race([deletion, new Promise((resolve) => setTimeout(resolve, 500, 'waits'))]);
    expect(soon).toBe('waits');
    const stack = await buildStack(api.models, people.group, { name: 'Just in time', document });
    return { stack, deletion };
  });
  expect(issuePaths(await stored.deletion)).toEqual(['stacks[0]']);
  await stored.stack.destroy();
  await editor.delete(`/api/v1/materials/${id}`).expect(204);
});

test('a part of a mixture must be plain, and a formula must have a value', async () => {
  const { id } = await create();
  const mixtureOf = (material: string) => ({
    ...buildContent({ voigt: null, voigtSource: null }),
    index: {
      kind: 'mixture of',
      model: 'bruggeman',
      fraction: 0.5,
      parts: [
        { material, version: 1 },
        { material: id, version: 1 },
      ],
    },
  });
  const mixed = await create(mixtureOf(id));
  for (const part of [mixed.id, 'no-such']) {
    const content = mixtureOf(part);
    const answer = await editor
      .post(address())
      .send({ ...naming, content })
      .expect(422);
    expect(issuePaths(answer)).toEqual(['content.index.parts[0].material']);
  }
  const content = buildContent({
    index: { kind: 'formula', expression: 'process.exit(1)', coefficients: [], rangeNm: [400, 800] },
  });
  const hostile = await editor.post(`${address()}/preview`).send({ content }).expect(422);
  expect(issuePaths(hostile)).toEqual(['content.index.expression']);
});

test('a stored run keeps its version, and a formula of somebody is solved like any other', async () => {
  const index = { kind: 'formula', expression: '2 + c1 * L', coefficients: [0.1], rangeNm: [400, 800] };
  const { id } = await create({ ...buildContent({ voigt: null, voigtSource: null }), index });
  const axis = { kind: 'angle', from: 0, to: 60, points: 3, spacing: 'linear' } as const;
  const { start } = runCalls(editor, people.group.id, axis);
  const run = await start({ document: buildDocument({ substrate: { material: id } }) });
  const newer = { ...index, coefficients: [0.2] };
  await editor
    .post(`/api/v1/materials/${id}/versions`)
    .send({ version: 1, content: { ...buildContent({ voigt: null, voigtSource: null }), index: newer } })
    .expect(201);
  expect(run.materials).toMatchObject([{ id, version: 1 }]);
  const input = await editor.get(`/api/v1/runs/${run.id}/input.json`).buffer(true).expect(200);
  // 2 + 0.1 * 0.6328, by hand
  expect(input.text).toContain('2.06328');
  expect(issuePaths(await editor.delete(`/api/v1/materials/${id}`).expect(409))).toEqual(['runs[0]']);
});

test('an exported file is read back to the same constants', async () => {
  const { id, content } = await create();
  const csv = await editor.get(`/api/v1/materials/${id}/export.csv`).buffer(true).expect(200);
  expect(csv.headers['content-disposition']).toBe('attachment; filename=Co-Cobalt-ours-v1.csv');
  const row = await api.models.MaterialImport.create({
    groupId: people.group.id,
    createdById: null,
    fileName: 'co.csv',
    sha256: id,
    bytes: Buffer.from(csv.text),
    size: csv.text.length,
  });
  const { exported, table } = await api.dependencies.pool.readTable(Buffer.from(csv.text));
  await row.update({ state: 'ready', exported, tableJson: table });
  const body = { ...naming, exportedBy: row.id };
  const again = read(materialSchema, await editor.post(address()).send(body).expect(201));
  expect(again.content).toEqual(content);
});
