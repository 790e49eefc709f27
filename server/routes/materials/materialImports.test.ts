import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { materialSchema } from '../../../shared/material.ts';
import type { ImportMapping } from '../../../shared/materialImport.ts';
import { ownHabits } from '../../../shared/materialImport.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildContent, buildDocument, buildImport, buildPeople } from '../../../tests/factories.ts';
import { runCalls } from '../../../tests/runCalls.ts';

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

const naming = { name: 'Iron, imported', formula: 'Fe', class: 'magnet' };
const address = () => `/api/v1/groups/${people.group.id}/materials`;

/** A source of exp(+iwt) and -iQ with one empty cell and a row that is no number. */
const text = 'nm;n;k;re;im\n400;2;-3;0,03;0,01\n500;;-3;0,03;0,01\n600;2,2;-3,5;0,03;0,01\n';
const mapping: ImportMapping = {
  spectral: { column: 0, unit: 'nm' },
  index: { from: 'n, k', n: 1, k: 2 },
  voigt: { from: 'Q', re: 3, im: 4 },
  indexOf: null,
  habits: { ...ownHabits, time: 'exp(+iwt)', voigtSign: '-iQ' },
};

async function ready(given: string) {
  const { table, exported } = await api.dependencies.pool.readTable(Buffer.from(given));
  return buildImport(api.models, people.group, { text: given, state: 'ready', tableJson: table, exported });
}

const imported = (importId: string, of: ImportMapping = mapping) => ({
  ...buildContent(),
  index: { kind: 'import', importId, mapping: of },
  voigt: { kind: 'import', importId, mapping: of },
});

test('a mapped table becomes a material that keeps how it was read, and its file stays', async () => {
  const { id: importId } = await ready(text);
  const body = { ...naming, content: imported(importId) };
  const made = read(materialSchema, await editor.post(address()).send(body).expect(201));
  // conj N and conj Q, physics.md section 2
  expect(made.content.index).toMatchObject({ wavelengthsNm: [400, 600], n: [2, 2.2], k: [3, 3.5] });
  const conjugated = [0.03, -0.01];
  expect(made.content.voigt).toMatchObject({ kind: 'table', q: [conjugated, conjugated, conjugated] });
  const origin = made.content.origin?.index;
  expect(origin).toMatchObject({ importId, rows: 3, mapping });
  expect(origin?.sentences.join(' ')).toContain('exp(+iwt)');
  const codes = origin?.warnings.map(({ code }) => code);
  // Noticed while reading, and while converting.
  expect(codes).toContain('empty-cells');
  expect(codes).toContain('few-points');
  const refused = await editor.delete(`/api/v1/imports/${importId}`).expect(409);
  expect(refusalOf(refused).issues?.[0]?.message).toContain('Iron, imported');
  await editor.delete(`/api/v1/materials/${made.id}`).expect(204);
  await editor.delete(`/api/v1/imports/${importId}`).expect(204);
});

test('what is wrong with a mapping stands at its field', async () => {
  const { id } = await ready(text);
  const send = async (content: object) =>
    issuePaths(
      await editor
        .post(address())
        .send({ ...naming, content })
        .expect(422),
    );
  const wrongTime = { ...mapping, habits: ownHabits };
  expect(await send(imported(id, wrongTime))).toEqual(['content.index.mapping.habits.time']);
  const noVoigt = { ...mapping, voigt: null };
  expect(await send(imported(id, noVoigt))).toEqual(['content.voigt.mapping.voigt']);
  expect(await send(imported('00000000-0000-4000-8000-000000000000'))).toEqual(['content.index.importId']);
  const foreign = await buildImport(api.models, people.strangersGroup, { text, state: 'ready' });
  expect(await send(imported(foreign.id))).toEqual(['content.index.importId']);
});

test('n and k in place of a mixture do not take the Q of its parts with them', async () => {
  const part = read(
    materialSchema,
    await editor
      .post(address())
      .send({ ...naming, content: buildContent() })
      .expect(201),
  );
  const parts = [
    { material: part.id, version: 1 },
    { material: part.id, version: 1 },
  ];
  const index = { kind: 'mixture of', model: 'bruggeman', fraction: 0.25, parts };
  const mixture = { ...buildContent(), index, voigt: { kind: 'mixture' } };
  const mixed = read(
    materialSchema,
    await editor
      .post(address())
      .send({ ...naming, name: 'Mixed', content: mixture })
      .expect(201),
  );
  const { id } = await ready('nm,n,k\n400,2,3\n600,2.2,3.5\n');
  const only = { ...mapping, voigt: null, habits: ownHabits };
  const content = { ...imported(id, only), voigt: { kind: 'mixture' } };
  const answer = await editor
    .post(`/api/v1/materials/${mixed.id}/versions`)
    .send({ version: 1, content })
    .expect(422);
  expect(issuePaths(answer)).toEqual(['content.voigt']);
  expect(refusalOf(answer).issues?.[0]?.message).toContain('give Q of its own or none');

  const axis = { kind: 'angle', from: 0, to: 60, points: 3, spacing: 'linear' } as const;
  const { start } = runCalls(editor, people.group.id, axis);
  const run = await start({ document: buildDocument({ substrate: { material: mixed.id } }) });
  expect(run.assumptions.join('\n')).toContain(
    `Mixed (${mixed.id}) is a mixture: 75 % Iron, imported (${part.id}, version 1) and 25 % Iron, imported`,
  );
});
