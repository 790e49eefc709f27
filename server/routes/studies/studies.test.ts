import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { createdLinkSchema, linkListSchema } from '../../../shared/link.ts';
import { studyListSchema, studySchema, studyVersionListSchema } from '../../../shared/study.ts';
import type { StudyDocument } from '../../../shared/study.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer, Browser } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildPeople, buildRun } from '../../../tests/factories.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let browser: Browser;
beforeAll(async () => (api = await startApiServer()));
beforeEach(async () => {
  people = await buildPeople(api.models);
  browser = await api.signedIn(people.editor);
});
afterAll(() => api.stop());

const document = (overrides: Partial<StudyDocument> = {}): StudyDocument => ({
  question: 'Which cap?',
  items: [],
  decision: '',
  ...overrides,
});
const runItem = (id: string, runId: string) => ({ kind: 'run' as const, id, runId, view: '', caption: '' });
const groupUrl = () => `/api/v1/groups/${people.group.id}/studies`;
const make = async (given: StudyDocument) =>
  read(studySchema, await browser.post(groupUrl()).send({ title: 'Caps', document: given }).expect(201));
const save = (study: { id: string }, body: object) => browser.patch(`/api/v1/studies/${study.id}`).send(body);

describe('a study', () => {
  test('is made, read, saved and deleted; its history says what changed, and the trail tells', async () => {
    const run = await buildRun(api.models, people.group, { name: 'Angles' });
    const made = await make(document({ items: [runItem('a', run.id)] }));
    expect(made).toMatchObject({ version: 1, itemCount: 1, question: 'Which cap?', decided: null });
    const items = [{ kind: 'note' as const, id: 'n', text: 'Gold hides less.' }, ...made.document.items];
    const saved = read(
      studySchema,
      await save(made, { version: 1, document: { ...made.document, items } }).expect(200),
    );
    expect(saved).toMatchObject({ version: 2, itemCount: 2, updatedBy: people.editor.name });
    expect(read(studySchema, await browser.get(`/api/v1/studies/${made.id}`).expect(200))).toEqual(saved);
    const { studies } = read(studyListSchema, await browser.get(groupUrl()).expect(200));
    expect(studies.map(({ id, version }) => [id, version])).toEqual([[made.id, 2]]);
    const unchanged = read(studySchema, await save(made, { version: 2, title: 'Caps' }).expect(200));
    expect(unchanged.version).toBe(2);
    await save(made, { version: 2, document: document() }).expect(200);
    const { versions } = read(
      studyVersionListSchema,
      await browser.get(`/api/v1/studies/${made.id}/versions`).expect(200),
    );
    expect(versions.map(({ version, savedBy, changes }) => [version, savedBy, changes])).toEqual([
      [
        3,
        people.editor.name,
        ['Note removed, which stood at place 1.', 'Run "Angles" removed, which stood at place 2.'],
      ],
      [2, people.editor.name, ['Note added at place 1.']],
      [1, people.editor.name, ['Study made.']],
    ]);
    await browser.delete(`/api/v1/studies/${made.id}`).expect(204);
    await browser.get(`/api/v1/studies/${made.id}`).expect(404);
    const trail = await api.models.Activity.findAll({ where: { groupId: people.group.id }, order: ['id'] });
    expect(trail.map((line) => line.action)).toEqual([
      'study.create',
      'study.update',
      'study.update',
      'study.delete',
    ]);
  });

  test('is not saved over what somebody else saved; the same save sent twice is one', async () => {
    const made = await make(document());
    const first = { version: 1, title: 'By the editor' };
    await save(made, first).expect(200);
    expect(read(studySchema, await save(made, first).expect(200)).version).toBe(2);
    const owner = await api.signedIn(people.owner);
    const late = await owner.patch(`/api/v1/studies/${made.id}`).send({ version: 1, title: 'Late' });
    expect(late.status).toBe(409);
    expect(refusalOf(late).message).toContain(people.editor.name);
  });

  test('says who decided and when: whoever last edited the words of the decision', async () => {
    const made = await make(document({ decision: 'Gold.' }));
    expect(made.decided).toMatchObject({ by: people.editor.name });
    const owner = await api.signedIn(people.owner);
    const saveAsOwner = async (version: number, given: StudyDocument) =>
      read(
        studySchema,
        await owner.patch(`/api/v1/studies/${made.id}`).send({ version, document: given }).expect(200),
      );
    const reworded = await saveAsOwner(1, document({ decision: 'Gold.', question: 'Which cap, really?' }));
    expect(reworded.decided).toEqual(made.decided);
    const changed = await saveAsOwner(2, document({ decision: 'Platinum.' }));
    expect(changed.decided).toMatchObject({ by: people.owner.name });
    expect(Date.parse(changed.decided!.at)).toBeGreaterThan(Date.parse(made.decided!.at));
    expect((await saveAsOwner(3, document({ decision: '  ' }))).decided).toBeNull();
  });

  test('shows only what is of its own group, except what it showed before it was deleted', async () => {
    const foreign = await buildRun(api.models, people.strangersGroup);
    const own = await buildRun(api.models, people.group);
    const items = [runItem('a', own.id), runItem('b', foreign.id), runItem('c', 'no id')];
    const refused = await browser.post(groupUrl()).send({
      title: 'Caps',
      document: document({
        items: [...items, { kind: 'design', id: 'd', designId: own.id, view: '', caption: '' }],
      }),
    });
    expect(refused.status).toBe(422);
    expect(issuePaths(refused)).toEqual([
      'document.items[1].runId',
      'document.items[2].runId',
      'document.items[3].designId',
    ]);
    const made = await make(document({ items: [runItem('a', own.id)] }));
    await own.destroy();
    await save(made, {
      version: 1,
      document: document({ items: [runItem('other', own.id)], question: 'Still?' }),
    }).expect(200);
  });

  test('can be read by a viewer and changed by an editor; a stranger does not learn that it exists', async () => {
    const made = await make(document());
    const viewer = await api.signedIn(people.viewer);
    await viewer.get(`/api/v1/studies/${made.id}`).expect(200);
    await viewer.patch(`/api/v1/studies/${made.id}`).send({ version: 1, title: 'No' }).expect(403);
    await viewer.post(groupUrl()).send({ title: 'No', document: document() }).expect(403);
    await viewer.get(`/api/v1/studies/${made.id}/links`).expect(403);
    const stranger = await api.signedIn(people.stranger);
    await stranger.get(`/api/v1/studies/${made.id}`).expect(404);
    await stranger.get(`/api/v1/studies/${made.id}/versions`).expect(404);
    await stranger.delete(`/api/v1/studies/${made.id}`).expect(404);
    await api.anonymous().get(`/api/v1/studies/${made.id}`).expect(401);
  });
});

test('links of a study are made and listed, and end with it', async () => {
  const made = await make(document());
  const url = `/api/v1/studies/${made.id}/links`;
  const created = read(createdLinkSchema, await browser.post(url).send({ label: 'For A.' }).expect(201));
  expect(created).toMatchObject({ opens: 'study', subjectId: made.id, subjectName: 'Caps' });
  const { links } = read(linkListSchema, await browser.get(url).expect(200));
  expect(links.map(({ id, label }) => [id, label])).toEqual([[created.id, 'For A.']]);
  const token = created.url.split('/').at(-1)!;
  const subject = await api.anonymous().get(`/api/v1/shared/${token}/subject`).expect(200);
  expect(subject.body).toEqual({ opens: 'study' });
  await api.anonymous().get(`/api/v1/shared/${token}`).expect(404);
  await browser.delete(`/api/v1/studies/${made.id}`).expect(204);
  await api.anonymous().get(`/api/v1/shared/${token}/subject`).expect(410);
});
