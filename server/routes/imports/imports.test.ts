import { createServer, request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { importPreviewSchema, materialImportSchema, ownHabits } from '../../../shared/materialImport.ts';
import type { ImportMapping, MaterialImport } from '../../../shared/materialImport.ts';
import { read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { PASSWORD, buildImport, buildPeople } from '../../../tests/factories.ts';
import { expireImports } from '../../jobs/expireImports.ts';
import { ImportReader } from '../../jobs/importReader.ts';

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

const table = 'nm,n,k\n400,2,3\n600,2.2,3.5\n800,2.4,4\n';
const mapping: ImportMapping = {
  spectral: { column: 0, unit: 'nm' },
  index: { from: 'n, k', n: 1, k: 2 },
  voigt: null,
  indexOf: null,
  habits: ownHabits,
};
const address = () => `/api/v1/groups/${people.group.id}/imports`;

async function upload(bytes: Buffer | string, fileName = 'co.csv'): Promise<MaterialImport> {
  const answer = await editor.post(address()).attach('file', Buffer.from(bytes), fileName).expect(202);
  return read(materialImportSchema, answer);
}

function ended(id: string): Promise<MaterialImport> {
  return vi.waitFor(
    async () => {
      const row = read(materialImportSchema, await editor.get(`/api/v1/imports/${id}`).expect(200));
      expect(row.state).not.toBe('reading');
      return row;
    },
    { timeout: 20_000, interval: 50 },
  );
}

test('a file is read beside, previewed without being stored, and handed out as it came', async () => {
  const { id } = await upload(table, '../../etc/Kobalt µ.csv');
  const row = await ended(id);
  expect(row).toMatchObject({ state: 'ready', progress: 1, fileName: 'Kobalt µ.csv', error: null });
  expect(row.table).toMatchObject({ rowCount: 3, delimiter: 'comma' });
  const preview = await editor.post(`/api/v1/imports/${id}/preview`).send(mapping).expect(200);
  expect(read(importPreviewSchema, preview)).toMatchObject({
    rowCount: 3,
    rangeNm: [400, 800],
    index: { n: [2, 2.2, 2.4], k: [3, 3.5, 4] },
  });
  const file = await editor.get(`/api/v1/imports/${id}/file`).buffer(true).responseType('blob').expect(200);
  expect((file.body as Buffer).toString()).toBe(table);
  expect(file.headers['content-disposition']).toBe('attachment; filename=Kobalt-.csv');
});

test('a pasted table goes the same way, and the same file sent twice is one import', async () => {
  const paste = await editor.post(address()).send({ text: table, fileName: 'pasted' }).expect(202);
  expect((await ended(read(materialImportSchema, paste).id)).table?.rowCount).toBe(3);
  const [first, second] = await Promise.all([upload(`${table}#1`, 'd'), upload(`${table}#1`, 'd')]);
  expect(second.id).toBe(first.id);
});

test.each([
  ['binary', Buffer.from([0, 1, 2, 3, 255, 254, 0, 0])],
  ['a spreadsheet renamed to .csv', Buffer.from('PK\u0003\u0004xl/workbook.xml')],
  ['not a number', 'nm,n,k\n400,NaN,3\n500,2,3\n'],
  ['nothing', ''],
])('%s is refused with a reason, and nothing of it is kept', async (_what, bytes) => {
  const { id } = await upload(bytes);
  const row = await ended(id);
  expect(row.state).toBe('refused');
  expect(row.error).toMatch(/\w/);
  const stored = await api.models.MaterialImport.scope('withBytes').findByPk(id);
  expect(stored?.bytes).toBeNull();
  await editor.get(`/api/v1/imports/${id}/file`).expect(409);
});

test('who may: roles, other groups, nobody', async () => {
  const viewer = await api.signedIn(people.viewer);
  const stranger = await api.signedIn(people.stranger);
  await viewer.post(address()).attach('file', Buffer.from(table), 'a.csv').expect(403);
  await stranger.post(address()).attach('file', Buffer.from(table), 'a.csv').expect(404);
  await api.anonymous().post(address()).attach('file', Buffer.from(table), 'a.csv').expect(401);
  const { id } = await upload(table, 'mine.csv');
  await ended(id);
  for (const part of ['', '/file']) {
    await viewer.get(`/api/v1/imports/${id}${part}`).expect(200);
    await stranger.get(`/api/v1/imports/${id}${part}`).expect(404);
  }
  await stranger.post(`/api/v1/imports/${id}/preview`).send(mapping).expect(404);
  await viewer.delete(`/api/v1/imports/${id}`).expect(403);
  await editor.delete(`/api/v1/imports/${id}`).expect(204);
  await editor.get(`/api/v1/imports/${id}`).expect(404);
});

test('two files, another part or none is no import', async () => {
  const file = Buffer.from(table);
  await editor.post(address()).attach('file', file, 'a').attach('file', file, 'b').expect(422);
  await editor.post(address()).attach('table', file, 'a').expect(422);
  const other = await editor
    .post(address())
    .set('Origin', 'https://elsewhere.example')
    .attach('file', file, 'a');
  expect(other.status).toBe(403);
});

test.each(['announced', 'sent without a length'])('1 GB %s is refused at once', async (how) => {
  const server = createServer(api.app).listen(0, '127.0.0.1');
  try {
    await new Promise((resolve) => server.once('listening', resolve));
    const { port } = server.address() as AddressInfo;
    const before = await api.models.MaterialImport.count();
    const answer = await hugeUpload(port, how === 'announced');
    expect(answer.status).toBe(413);
    expect(answer.text).toContain('too-large');
    expect(answer.sent).toBeLessThan(200_000_000);
    expect(await api.models.MaterialImport.count()).toBe(before);
  } finally {
    server.closeAllConnections();
    server.close();
  }
});

/** Sends zeros until the server answers, and tells how many bytes that took. */
async function hugeUpload(port: number, announced: boolean) {
  const signIn = await fetch(`http://127.0.0.1:${port}/api/v1/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: people.editor.email, password: PASSWORD }),
  });
  const cookie = signIn.headers
    .getSetCookie()
    .map((one) => one.split(';')[0])
    .join('; ');
  return new Promise<{ status: number; text: string; sent: number }>((resolve, reject) => {
    let sent = 0;
    let answered = false;
    const sender = httpRequest({
      port,
      host: '127.0.0.1',
      path: address(),
      method: 'POST',
      headers: {
        Cookie: cookie,
        'Content-Type': 'multipart/form-data; boundary=x',
        ...(announced && { 'Content-Length': '1000000000' }),
      },
    });
    sender.on('error', (error) => (answered ? undefined : reject(error)));
    sender.on('response', (response) => {
      answered = true;
      let text = '';
      response.on('data', (piece: Buffer) => (text += piece.toString()));
      response.on('end', () => {
        sender.destroy();
        resolve({ status: response.statusCode ?? 0, text, sent });
      });
    });
    sender.write('--x\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n');
    const piece = Buffer.alloc(1_000_000, '1');
    const send = () => {
      if (answered || sent >= 1_000_000_000) return;
      sent += piece.length;
      sender.write(piece, send);
    };
    send();
  });
}

test('what a server that died left unread is read by the next', async () => {
  const lost = await buildImport(api.models, people.group, { readingAt: new Date(Date.now() - 600_000) });
  const fresh = await buildImport(api.models, people.group, { fileName: 'fresh.csv' });
  const reader = new ImportReader(api.dependencies);
  await reader.readLost();
  expect((await ended(lost.id)).table?.rowCount).toBe(3);
  expect((await fresh.reload()).state).toBe('reading');
  await reader.stop();
  await fresh.destroy();
});

test('files that nobody used are gone after a week', async () => {
  const days = (count: number) => new Date(Date.now() - count * 86_400_000);
  const old = await buildImport(api.models, people.group, { state: 'ready', createdAt: days(8) });
  const young = await buildImport(api.models, people.group, { state: 'ready', createdAt: days(6) });
  await expireImports(api.models);
  expect(await api.models.MaterialImport.findByPk(old.id)).toBeNull();
  expect(await api.models.MaterialImport.findByPk(young.id)).not.toBeNull();
});

test('pasted text beyond the limit of a body is refused with its reason', async () => {
  const answer = await editor
    .post(address())
    .send({ text: '1'.repeat(4_100_000) })
    .expect(413);
  expect(refusalOf(answer).message).toContain('MB');
});
