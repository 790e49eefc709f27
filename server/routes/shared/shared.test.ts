import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { CreatedLink, Link } from '../../../shared/link.ts';
import { decodeResult } from '../../../shared/resultFormat.ts';
import { sharedRunSchema } from '../../../shared/run.ts';
import type { Run, SharedRun } from '../../../shared/run.ts';
import { solveRequestSchema } from '../../../shared/solve.ts';
import type { Stack } from '../../../shared/stack.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import {
  buildDocument,
  buildMaterial,
  buildPeople,
  buildRun,
  buildShareLink,
  buildStack,
} from '../../../tests/factories.ts';
import { waitForRun } from '../../../tests/waitForRun.ts';

let server: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let owner: TestAgent;
let editor: TestAgent;
let viewer: TestAgent;
let stranger: TestAgent;
let anonymous: TestAgent;

beforeAll(async () => {
  server = await startApiServer();
  people = await buildPeople(server.models);
  owner = await server.signedIn(people.owner);
  editor = await server.signedIn(people.editor);
  viewer = await server.signedIn(people.viewer);
  stranger = await server.signedIn(people.stranger);
  anonymous = server.anonymous();
});
afterAll(() => server.stop());

async function finishedRun(wanted: { document?: Run['document']; stackId?: string } = {}): Promise<Run> {
  const request = {
    groupId: people.group.id,
    name: 'Shared sweep',
    document: buildDocument(),
    axis: { kind: 'angle', from: 0, to: 60, points: 31, spacing: 'linear' },
    ...wanted,
  };
  const { body } = (await editor.post('/api/v1/runs').send(request).expect(201)) as { body: Run };
  await waitForRun(server.models, body.id, 'done');
  const again = (await editor.get(`/api/v1/runs/${body.id}`).expect(200)) as { body: Run };
  return again.body;
}

async function share(runId: string, wanted: object = {}): Promise<CreatedLink & { token: string }> {
  const { body } = (await editor.post(`/api/v1/runs/${runId}/links`).send(wanted).expect(201)) as {
    body: CreatedLink;
  };
  const token = /^http:\/\/skewlight\.test\/share\/([\w-]{43})$/.exec(body.url)?.[1];
  if (token === undefined) throw new Error(`No token in ${body.url}`);
  return { ...body, token };
}

async function linksAt(browser: TestAgent, path: string): Promise<Link[]> {
  const { body } = (await browser.get(`/api/v1${path}`).expect(200)) as { body: { links: Link[] } };
  return body.links;
}

describe('a share link', () => {
  it('opens its run without an account and leaks nothing else of the group', async () => {
    const stack = await buildStack(server.models, people.group, { name: 'Secret stack name' });
    const run = await finishedRun({ stackId: stack.id });
    const { token } = await share(run.id);
    const response = await anonymous.get(`/api/v1/shared/${token}`).expect(200);
    const shared = response.body as SharedRun;
    const { second: _second, family: _family, ...always } = sharedRunSchema.shape;
    expect(Object.keys(shared).sort()).toEqual(Object.keys(always).sort());
    expect(shared).toMatchObject({
      name: 'Shared sweep',
      document: run.document,
      inputSha256: run.inputSha256,
    });
    const { group, editor: maker, owner: lead } = people;
    const secrets = [
      group.id,
      group.name,
      run.id,
      stack.id,
      'Secret stack name',
      maker.name,
      maker.email,
      lead.name,
    ];
    for (const secret of secrets) expect(response.text).not.toContain(secret);
    expect(response.headers['cache-control']).toBe('no-store');
    expect(response.headers['referrer-policy']).toBe('no-referrer');
  });

  it('hands out the numbers, the CSV and the input', async () => {
    const run = await finishedRun();
    const { token } = await share(run.id);
    const data = (await anonymous
      .get(`/api/v1/shared/${token}/data?readings=rotationP`)
      .buffer(true)
      .responseType('blob')
      .expect(200)) as { body: Buffer };
    expect(decodeResult(Uint8Array.from(data.body).buffer).axis).toHaveLength(31);
    const { text: csv } = await anonymous.get(`/api/v1/shared/${token}/data.csv`).buffer(true).expect(200);
    expect(csv.split('\r\n')).toHaveLength(33);
    const { text: input } = await anonymous
      .get(`/api/v1/shared/${token}/input.json`)
      .buffer(true)
      .expect(200);
    expect(solveRequestSchema.parse(JSON.parse(input)).cases).toHaveLength(1);
  });

  it('shows the run as it was, whatever happens to the stack, the material and the maker', async () => {
    const material = await buildMaterial(server.models, { group: people.group, name: 'Oldname' });
    const layers = [
      {
        id: 'film',
        medium: { material: material.id },
        thicknessNm: 3,
        m: [0, 0, 1] as [number, number, number],
      },
    ];
    const document = buildDocument({ layers });
    const stack = await buildStack(server.models, people.group, { document });
    const run = await finishedRun({ document, stackId: stack.id });
    const { token } = await share(run.id);
    const before = (await anonymous.get(`/api/v1/shared/${token}`).expect(200)) as { body: SharedRun };
    await editor.delete(`/api/v1/stacks/${stack.id}`).expect(204);
    await material.update({ name: 'Newname' });
    const after = (await anonymous.get(`/api/v1/shared/${token}`).expect(200)) as { body: SharedRun };
    expect(after.body).toEqual(before.body);
    expect(after.body.materials).toMatchObject([{ name: 'Oldname' }]);
  });

  it('is stored as a hash only', async () => {
    const run = await finishedRun();
    const { token, id } = await share(run.id);
    const row = await server.models.ShareLink.findByPk(id);
    expect(row!.tokenHash).toMatch(/^[0-9a-f]{64}$/);
    expect(JSON.stringify(row)).not.toContain(token);
    const activity = await server.models.Activity.findAll({ where: { groupId: people.group.id } });
    expect(JSON.stringify(activity)).not.toContain(token);
  });

  it('tells when and how often it was opened', async () => {
    const run = await finishedRun();
    const { token, id } = await share(run.id, { label: 'for the reviewer' });
    const [fresh] = await linksAt(editor, `/runs/${run.id}/links`);
    expect(fresh).toMatchObject({
      id,
      label: 'for the reviewer',
      useCount: 0,
      lastUsedAt: null,
      revokedAt: null,
    });
    expect(fresh!.createdBy).toBe(people.editor.name);
    await anonymous.get(`/api/v1/shared/${token}`).expect(200);
    await anonymous.get(`/api/v1/shared/${token}`).expect(200);
    const [used] = await linksAt(editor, `/runs/${run.id}/links`);
    expect(used!.useCount).toBe(2);
    expect(Date.parse(used!.lastUsedAt!)).toBeGreaterThan(Date.now() - 60_000);
  });

  it('answers 410 once it is revoked, in all its parts', async () => {
    const run = await finishedRun();
    const { token, id } = await share(run.id);
    await editor.delete(`/api/v1/links/${id}`).expect(204);
    await editor.delete(`/api/v1/links/${id}`).expect(204);
    for (const part of ['', '/data', '/data.csv', '/input.json']) {
      const response = await anonymous.get(`/api/v1/shared/${token}${part}`).expect(410);
      expect(response.body).toMatchObject({ error: { code: 'gone' } });
      expect(response.text).not.toContain('Shared sweep');
    }
    const [link] = await linksAt(editor, `/runs/${run.id}/links`);
    expect(link!.revokedAt).not.toBeNull();
  });

  it('answers 410 once it has expired, and is not made when it would be at once', async () => {
    const run = await finishedRun();
    const past = new Date(Date.now() - 1_000);
    await editor.post(`/api/v1/runs/${run.id}/links`).send({ expiresAt: past.toISOString() }).expect(422);
    const row = await server.models.Run.findByPk(run.id);
    const { token } = await buildShareLink(server.models, row!, { expiresAt: past });
    await anonymous.get(`/api/v1/shared/${token}`).expect(410);
    const future = new Date(Date.now() + 60_000).toISOString();
    const { token: open, expiresAt } = await share(run.id, { expiresAt: future });
    expect(expiresAt).toBe(future);
    await anonymous.get(`/api/v1/shared/${open}`).expect(200);
  });

  it('answers 410 once its run is deleted, and 404 when it never was', async () => {
    const run = await finishedRun();
    const { token } = await share(run.id);
    await editor.delete(`/api/v1/runs/${run.id}`).expect(204);
    await anonymous.get(`/api/v1/shared/${token}`).expect(410);
    await anonymous.get(`/api/v1/shared/${'x'.repeat(43)}`).expect(404);
    await anonymous.get(`/api/v1/shared/${token.slice(0, -1)}`).expect(404);
    await anonymous.get('/api/v1/shared/%00').expect(404);
  });

  it('is made for a run that has its numbers only', async () => {
    const waiting = await buildRun(server.models, people.group, { state: 'failed' });
    await editor.post(`/api/v1/runs/${waiting.id}/links`).send({}).expect(409);
  });
});

describe('who may', () => {
  it('make, see and revoke links: editors; see those of the group: owners', async () => {
    const run = await finishedRun();
    const { id } = await share(run.id);
    await viewer.post(`/api/v1/runs/${run.id}/links`).send({}).expect(403);
    await viewer.get(`/api/v1/runs/${run.id}/links`).expect(403);
    await viewer.delete(`/api/v1/links/${id}`).expect(403);
    await stranger.post(`/api/v1/runs/${run.id}/links`).send({}).expect(404);
    await stranger.delete(`/api/v1/links/${id}`).expect(404);
    await anonymous.delete(`/api/v1/links/${id}`).expect(401);
    await editor.get(`/api/v1/groups/${people.group.id}/links`).expect(403);
    await stranger.get(`/api/v1/groups/${people.group.id}/links`).expect(404);
    const all = await linksAt(owner, `/groups/${people.group.id}/links`);
    expect(all[0]).toMatchObject({
      id,
      opens: 'run',
      subjectId: run.id,
      subjectName: 'Shared sweep',
      revokedAt: null,
    });
    expect(new Set(all.map(({ subjectId }) => subjectId)).size).toBeGreaterThan(1);
  });
});

describe('open in my group', () => {
  it('puts the stack of the run into a group of the reader', async () => {
    const run = await finishedRun();
    const { token } = await share(run.id);
    const { id: groupId } = people.strangersGroup;
    const { body } = (await stranger
      .post(`/api/v1/shared/${token}/stacks`)
      .send({ groupId })
      .expect(201)) as {
      body: Stack;
    };
    expect(body).toMatchObject({ groupId, name: 'Shared sweep', document: run.document });
    await stranger.get(`/api/v1/stacks/${body.id}`).expect(200);
    await editor.get(`/api/v1/stacks/${body.id}`).expect(404);
  });

  it("turns a group's own material into constants at the working point", async () => {
    const material = await buildMaterial(server.models, { group: people.group, name: 'Private' });
    const film = {
      id: 'film',
      medium: { material: material.id },
      thicknessNm: 3,
      m: [0, 0, 1] as [number, number, number],
    };
    const base = buildDocument();
    const document = buildDocument({
      layers: [{ id: 'block', repeat: 2, layers: [film] }],
      workingPoint: { ...base.workingPoint, wavelengthNm: 600 },
    });
    const run = await finishedRun({ document });
    const { token } = await share(run.id);
    const { id: groupId } = people.strangersGroup;
    const { body } = (await stranger
      .post(`/api/v1/shared/${token}/stacks`)
      .send({ groupId })
      .expect(201)) as {
      body: Stack;
    };
    // The table of buildContent at 600 nm; in photon energy that is two thirds of the way between Q's two entries.
    expect(body.document.layers).toMatchObject([
      { layers: [{ medium: { index: [2.2, 3.5], label: 'Private' }, thicknessNm: 3 }] },
    ]);
    expect(JSON.stringify(body.document)).not.toContain(material.id);
    expect(body.document.layers).toMatchObject([
      { layers: [{ medium: { voigt: [expect.closeTo(0.02 + 0.01 * (2 / 3), 12), 0.01] } }] },
    ]);
  });

  it('needs a session and the right to add to that group', async () => {
    const run = await finishedRun();
    const { token, id } = await share(run.id);
    const to = (browser: TestAgent, groupId: string) =>
      browser.post(`/api/v1/shared/${token}/stacks`).send({ groupId });
    await to(anonymous, people.strangersGroup.id).expect(401);
    await to(viewer, people.group.id).expect(403);
    await to(stranger, people.group.id).expect(404);
    await to(stranger, 'not-an-id').expect(404);
    await editor.delete(`/api/v1/links/${id}`).expect(204);
    await to(stranger, people.strangersGroup.id).expect(410);
  });
});
