import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Design } from '../../../shared/design.ts';
import { designResultSchema } from '../../../shared/design.ts';
import { createdLinkSchema } from '../../../shared/link.ts';
import { decodeResult } from '../../../shared/resultFormat.ts';
import { runSchema } from '../../../shared/run.ts';
import type { Run } from '../../../shared/run.ts';
import { solveRequestSchema } from '../../../shared/solve.ts';
import { sharedStudySchema, studySchema } from '../../../shared/study.ts';
import type { Study, StudyItem } from '../../../shared/study.ts';
import { read, refusalOf } from '../../../tests/answers.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { designCalls } from '../../../tests/designCalls.ts';
import { buildToleranceInput } from '../../../tests/designInputs.ts';
import { buildDocument, buildPeople, buildRun, buildStack } from '../../../tests/factories.ts';
import { waitForRun } from '../../../tests/waitForRun.ts';

let server: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let editor: TestAgent;
let anonymous: TestAgent;
/** Of one group: what the study shows, and what it does not. */
let shown: { run: Run; design: Design };
let hidden: { run: Run; design: Design };

beforeAll(async () => {
  server = await startApiServer();
  people = await buildPeople(server.models);
  editor = await server.signedIn(people.editor);
  anonymous = server.anonymous();
  const { finished } = designCalls(editor, server.models, people.group.id);
  shown = { run: await sweep('Shown sweep'), design: await finished(buildToleranceInput()) };
  const { tolerance } = buildToleranceInput();
  const question = buildToleranceInput({ tolerance: { ...tolerance, seed: 8 } });
  hidden = { run: await sweep('Secret sweep'), design: await finished(question) };
});
afterAll(() => server.stop());

async function sweep(name: string): Promise<Run> {
  const stack = await buildStack(server.models, people.group, { name: 'Secret stack name' });
  const axis = { kind: 'angle', from: 0, to: 60, points: 31, spacing: 'linear' };
  const wanted = { groupId: people.group.id, stackId: stack.id, name, document: buildDocument(), axis };
  const { id } = read(runSchema, await editor.post('/api/v1/runs').send(wanted).expect(201));
  await waitForRun(server.models, id, 'done');
  return read(runSchema, await editor.get(`/api/v1/runs/${id}`).expect(200));
}

const runItem = (runId: string): StudyItem => ({ kind: 'run', id: runId, runId, view: '', caption: '' });
const designItem = (designId: string): StudyItem => ({
  ...{ kind: 'design', id: designId, designId, view: '', caption: '' },
});
const note: StudyItem = { kind: 'note', id: 'n', text: 'Platinum hides more.' };

async function studyOf(items: StudyItem[]): Promise<Study> {
  const document = { question: 'Which cap?', items, decision: 'Gold.' };
  const answer = editor.post(`/api/v1/groups/${people.group.id}/studies`);
  return read(studySchema, await answer.send({ title: 'Caps', document }).expect(201));
}

async function share({ id }: { id: string }) {
  const answer = await editor.post(`/api/v1/studies/${id}/links`).send({}).expect(201);
  const link = read(createdLinkSchema, answer);
  return { id: link.id, at: `/api/v1/shared/${link.url.split('/').at(-1)}` };
}

const shownItems = () => [note, designItem(shown.design.id), runItem(shown.run.id)];

const runFiles = ['data', 'data.csv', 'input.json'];
const designFiles = ['result', 'result.csv', 'input.json'];
const filesOf = ({ run, design }: { run: { id: string }; design: { id: string } }) => [
  ...runFiles.map((file) => `/runs/${run.id}/${file}`),
  ...designFiles.map((file) => `/designs/${design.id}/${file}`),
];

describe('a shared study', () => {
  it('opens without an account, with its runs and designs and nothing else of the group', async () => {
    const { at } = await share(await studyOf(shownItems()));
    const answer = await anonymous.get(`${at}/study`).expect(200);
    const study = read(sharedStudySchema, answer);
    expect(study).toMatchObject({ title: 'Caps', decided: { by: people.editor.name } });
    expect(study.document.items).toEqual(shownItems());
    const { run, design } = shown;
    expect(study.runs).toMatchObject([
      { id: run.id, run: { name: 'Shown sweep', inputSha256: run.inputSha256 } },
    ]);
    expect(study.designs).toMatchObject([{ id: design.id, design: { inputSha256: design.inputSha256 } }]);
    const { group, editor: maker, owner } = people;
    const secrets = [group.id, group.name, maker.email, maker.id, owner.name, run.stackId!, 'Secret'];
    for (const secret of secrets) expect(answer.text).not.toContain(secret);
    expect(answer.headers['cache-control']).toBe('no-store');
    expect(answer.headers['referrer-policy']).toBe('no-referrer');
  });

  it('hands out the numbers, the CSV and the input of each run and design', async () => {
    const { at } = await share(await studyOf(shownItems()));
    const textOf = async (url: string, who = anonymous) => (await who.get(url).buffer(true).expect(200)).text;
    const run = `${at}/runs/${shown.run.id}`;
    const data = await anonymous
      .get(`${run}/data?readings=rotationP`)
      .buffer(true)
      .responseType('blob')
      .expect(200);
    const own = await editor
      .get(`/api/v1/runs/${shown.run.id}/data?readings=rotationP`)
      .buffer(true)
      .responseType('blob')
      .expect(200);
    expect(decodeResult(Uint8Array.from(data.body as Buffer).buffer).axis).toHaveLength(31);
    expect(data.body).toEqual(own.body);
    await anonymous.get(`${run}/data?readings=none`).expect(422);
    for (const file of ['data.csv', 'input.json']) {
      expect(await textOf(`${run}/${file}`)).toBe(
        await textOf(`/api/v1/runs/${shown.run.id}/${file}`, editor),
      );
    }
    const design = `${at}/designs/${shown.design.id}`;
    const result = read(designResultSchema, await anonymous.get(`${design}/result`).expect(200));
    expect(result.kind).toBe('tolerance');
    for (const file of ['result.csv', 'input.json']) {
      expect(await textOf(`${design}/${file}`)).toBe(
        await textOf(`/api/v1/designs/${shown.design.id}/${file}`, editor),
      );
    }
    for (const one of [run, design]) {
      const { cases } = solveRequestSchema.parse(JSON.parse(await textOf(`${one}/input.json`)));
      expect(cases.length).toBeGreaterThan(0);
    }
  });

  it('answers 404 for runs and designs that it does not show, its own group’s too', async () => {
    const { at } = await share(await studyOf(shownItems()));
    const crossed = { run: shown.design, design: shown.run };
    const unknown = { run: { id: people.group.id }, design: { id: 'no-id' } };
    for (const ids of [hidden, crossed, unknown]) {
      for (const file of filesOf(ids)) {
        const answer = await anonymous.get(at + file);
        expect([file, answer.status]).toEqual([file, 404]);
        expect(answer.text).not.toContain('Secret');
      }
    }
    // The routes of other kinds of link do not open it.
    for (const part of ['', '/data', '/design', '/result', '/card', '/card.pdf']) {
      await anonymous.get(at + part).expect(404);
    }
  });

  it('is shown as it now is: what was taken out or deleted since has no entry and no files', async () => {
    const deleted = await buildRun(server.models, people.group, { state: 'done' });
    const study = await studyOf([...shownItems(), runItem(deleted.id)]);
    const { at } = await share(study);
    const entries = async () => {
      const seen = read(sharedStudySchema, await anonymous.get(`${at}/study`).expect(200));
      return [...seen.runs, ...seen.designs].map(({ id }) => id);
    };
    expect(await entries()).toEqual([shown.run.id, deleted.id, shown.design.id]);
    await editor.delete(`/api/v1/runs/${deleted.id}`).expect(204);
    expect(await entries()).toEqual([shown.run.id, shown.design.id]);
    for (const file of runFiles) await anonymous.get(`${at}/runs/${deleted.id}/${file}`).expect(404);
    await editor
      .patch(`/api/v1/studies/${study.id}`)
      .send({ version: 1, document: { ...study.document, items: [note] } })
      .expect(200);
    expect(await entries()).toEqual([]);
    for (const file of filesOf(shown)) await anonymous.get(at + file).expect(404);
  });

  it('answers 410 in all its parts once the link is revoked or expired or the study deleted', async () => {
    const study = await studyOf(shownItems());
    const [revoked, expired, last] = [await share(study), await share(study), await share(study)];
    await editor.delete(`/api/v1/links/${revoked.id}`).expect(204);
    const past = new Date(Date.now() - 1_000);
    await server.models.ShareLink.update({ expiresAt: past }, { where: { id: expired.id } });
    await anonymous.get(`${last.at}/study`).expect(200);
    await editor.delete(`/api/v1/studies/${study.id}`).expect(204);
    for (const { at } of [revoked, expired, last]) {
      for (const part of ['/study', '/subject', ...filesOf(shown), ...filesOf(hidden)]) {
        const answer = await anonymous.get(at + part);
        expect([part, answer.status, refusalOf(answer).code]).toEqual([part, 410, 'gone']);
        expect(answer.text).not.toMatch(/Caps|sweep/);
      }
    }
  });

  it('counts how often it was opened, and does not open a study that never was', async () => {
    const { id, at } = await share(await studyOf([]));
    await anonymous.get(`${at}/study`).expect(200);
    await anonymous.get(`${at}/study`).expect(200);
    const row = await server.models.ShareLink.findByPk(id, { rejectOnEmpty: true });
    expect(row.useCount).toBe(2);
    await anonymous.get(`/api/v1/shared/${'x'.repeat(43)}/study`).expect(404);
  });
});
