import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { Issue } from '../../../shared/error.ts';
import { readingOf } from '../../../shared/readings.ts';
import type { ReadingName, Run, SweepAxis } from '../../../shared/run.ts';
import { solveRequestSchema } from '../../../shared/solve.ts';
import type { SolvePoint } from '../../../shared/solve.ts';
import { inMagnetizationState } from '../../../shared/stackCase.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { solveRequest } from '../../../worker/optics/solveRequest.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import {
  buildContent,
  buildDocument,
  buildMaterial,
  buildPeople,
  buildRun,
  buildSlowDocument,
  buildStack,
} from '../../../tests/factories.ts';
import type { RunCalls, WantedRun } from '../../../tests/runCalls.ts';
import { runCalls } from '../../../tests/runCalls.ts';
import { waitForRun } from '../../../tests/waitForRun.ts';

const angles: SweepAxis = { kind: 'angle', from: 0, to: 80, points: 81, spacing: 'linear' };
const endless: SweepAxis = { kind: 'angle', from: 0, to: 89, points: 1_000_000, spacing: 'linear' };

let server: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let editor: TestAgent;
let requestOf: RunCalls['requestOf'];
let start: RunCalls['start'];
let refused: RunCalls['refused'];
let dataOf: RunCalls['dataOf'];
let viewer: TestAgent;
let stranger: TestAgent;

beforeAll(async () => {
  server = await startApiServer();
  await server.dependencies.pool.warm();
  people = await buildPeople(server.models);
  editor = await server.signedIn(people.editor);
  ({ requestOf, start, refused, dataOf } = runCalls(editor, people.group.id, angles));
  viewer = await server.signedIn(people.viewer);
  stranger = await server.signedIn(people.stranger);
});
afterAll(() => server.stop());

async function finished(wanted: WantedRun = {}): Promise<Run> {
  const run = await start(wanted);
  await waitForRun(server.models, run.id, 'done');
  return run;
}

/** What a run must hold at each point, from the three states of its own input file. */
async function reproduced(runId: string, readings: readonly ReadingName[]): Promise<(number | null)[][]> {
  const { text } = await editor.get(`/api/v1/runs/${runId}/input.json`).buffer(true).expect(200);
  const request = solveRequestSchema.parse(JSON.parse(text));
  const points = (state: 'given' | 'zero' | 'reversed'): SolvePoint[] =>
    solveRequest({ cases: request.cases.map((one) => inMagnetizationState(one, state)) }).results.flatMap(
      (result) => result.points,
    );
  const [given, zero, reversed] = [points('given'), points('zero'), points('reversed')];
  return given.map((point, index) =>
    readings.map((name) => readingOf(name, point, zero[index]!, reversed[index]!)),
  );
}

describe('a run', () => {
  it('is stored with what it rests on, computed, and handed out as it was computed', async () => {
    const stack = await buildStack(server.models, people.group);
    const request = { ...requestOf(), stackId: stack.id };
    const { body: run } = (await editor.post('/api/v1/runs').send(request).expect(201)) as { body: Run };
    expect(run.name).toBe('Pt/Co/Pt: angle 0 to 80 deg');
    expect(run.stackName).toBe('Pt/Co/Pt');
    expect(run.createdBy).toBe(people.editor.name);
    expect(run.assumptions.join('\n')).toMatch(/632\.8 nm/);
    expect(run.inputSha256).toMatch(/^[0-9a-f]{64}$/);
    await waitForRun(server.models, run.id, 'done');

    const { body: done } = (await viewer.get(`/api/v1/runs/${run.id}`).expect(200)) as { body: Run };
    expect(done.progress).toEqual({ state: 'done', done: 81, total: 81, secondsLeft: null, error: null });
    expect(done.computeSeconds).toBeGreaterThan(0);
    const { header, axis, columns } = await dataOf(run.id);
    expect(header.inputSha256).toBe(run.inputSha256);
    expect(header.readings.map(({ name }) => name)).toEqual(run.readings);
    expect([...axis]).toEqual(Array.from({ length: 81 }, (_, index) => index));
    // The p rotation of this stack at normal incidence is that of its polar magnetization, and not zero.
    expect(Math.abs(columns.rotationP![0]!)).toBeGreaterThan(1e-3);
  });

  it.each<[string, SweepAxis]>([
    ['wavelength', { kind: 'wavelength', from: 420, to: 780, points: 37, spacing: 'linear' }],
    ['angle', { kind: 'angle', from: 0, to: 89.9, points: 33, spacing: 'linear' }],
    ['thickness', { kind: 'thickness', layerId: 'inner', from: 0.1, to: 500, points: 21, spacing: 'log' }],
  ])('over %s is reproduced to the last digit by its own input file', async (_kind, axis) => {
    const material = await buildMaterial(server.models, { group: people.group });
    const base = buildDocument();
    const document: StackDocument = {
      ...base,
      layers: [
        ...base.layers,
        {
          id: 'block',
          repeat: 4,
          layers: [
            { id: 'inner', medium: { material: material.id }, thicknessNm: 2, m: [0.3, 0.2, 0.6] },
            {
              id: 'spacer',
              medium: { index: [2.1, 3.2], extraordinary: [2.2, 3], axis: [1, 1, 1] },
              thicknessNm: 1,
            },
          ],
        },
      ],
      workingPoint: {
        wavelengthNm: 550,
        angleDeg: 52,
        input: 's',
        magnetization: { mode: 'direction', m: [0.1, 0.5, 0.7] },
      },
    };
    const readings: ReadingName[] = ['rotationP', 'ellipticityS', 'contrastP', 'crossPs', 'absorptanceS'];
    const run = await finished({ document, axis, readings });
    const { columns } = await dataOf(run.id);
    const expected = await reproduced(run.id, readings);
    expect(expected).toHaveLength(axis.points);
    readings.forEach((name, column) => {
      expect([...columns[name]!]).toEqual(expected.map((row) => row[column]));
    });
  });

  it('of an oxidized film in a spread beam on a slab is reproduced too, and says what is not ideal', async () => {
    const material = await buildMaterial(server.models, { group: people.group });
    const base = buildDocument();
    const document: StackDocument = {
      ...base,
      layers: [
        {
          id: 'film',
          medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] },
          thicknessNm: 6,
          m: [0, 0, 1],
          oxide: { medium: { material: material.id }, consumedNm: 1, expansion: 1.7 },
          dead: { topNm: 0.2, bottomNm: 0.4 },
        },
      ],
      substrate: { index: 1.5 },
      backside: { thicknessNm: 500_000, exit: { index: 1 } },
      spread: { shape: 'normal', thicknessPercent: 2, bandwidthNm: 3 },
    };
    const axis: SweepAxis = {
      kind: 'thickness',
      layerId: 'film',
      from: 2,
      to: 9,
      points: 8,
      spacing: 'linear',
    };
    const readings: ReadingName[] = ['rotationP', 'ellipticityS', 'reflectanceP', 'transmittanceS'];
    const run = await finished({ document, axis, readings });
    expect(run.document.layers).toMatchObject([{ oxide: { medium: { material: material.id, version: 1 } } }]);
    expect(run.assumptions.join('\n')).toMatch(/standard deviations of 2 % of every thickness, 3 nm/);
    expect(run.assumptions.join('\n')).not.toMatch(/plane, monochromatic|infinitely thick/);
    const { columns } = await dataOf(run.id);
    const expected = await reproduced(run.id, readings);
    readings.forEach((name, column) => {
      expect([...columns[name]!]).toEqual(expected.map((row) => row[column]));
    });
    expect(await refused({ document, axis: { ...axis, from: 1.5 } })).toMatchObject([{ path: 'axis.from' }]);
    const unknown = {
      ...document.layers[0]!,
      oxide: { medium: { material: 'nope' }, consumedNm: 1, expansion: 1 },
    };
    expect(await refused({ document: { ...document, layers: [unknown] } })).toMatchObject([
      { path: 'document.layers[0].oxide.medium' },
    ]);
  });

  it('pins the version of every material and keeps it when a newer one comes', async () => {
    const material = await buildMaterial(server.models, {
      contents: [buildContent(), buildContent({ voigt: null, voigtSource: null })],
    });
    const film = { id: 'film', medium: { material: material.id }, thicknessNm: 3 };
    const run = await start({ document: buildDocument({ layers: [film] }) });
    expect(run.materials).toMatchObject([
      { id: material.id, version: 2, name: 'Testium', assumedConstant: false },
    ]);
    expect(run.document.layers).toMatchObject([{ medium: { material: material.id, version: 2 } }]);
    const again = await start({
      document: buildDocument({ layers: [{ ...film, medium: { material: material.id, version: 2 } }] }),
    });
    expect(again.inputSha256).toBe(run.inputSha256);
    const older = await start({
      document: buildDocument({ layers: [{ ...film, medium: { material: material.id, version: 1 } }] }),
    });
    expect(older.inputSha256).not.toBe(run.inputSha256);
  });

  it('says where a constant known at one wavelength was used at others', async () => {
    const content = buildContent({ voigt: { kind: 'table', wavelengthsNm: [633], q: [[0.03, 0.01]] } });
    const material = await buildMaterial(server.models, { contents: [content] });
    const film = { id: 'film', thicknessNm: 3, m: [0, 0, 1] as [number, number, number] };
    const axis: SweepAxis = { kind: 'wavelength', from: 500, to: 700, points: 5, spacing: 'linear' };
    const refusedIssues = await refused({
      document: buildDocument({ layers: [{ ...film, medium: { material: material.id } }] }),
      axis,
    });
    expect(refusedIssues.map(({ path }) => path)).toEqual(['axis.from', 'axis.to']);
    const allowed = await start({
      document: buildDocument({
        layers: [{ ...film, medium: { material: material.id, assumeConstant: true } }],
      }),
      axis,
    });
    expect(allowed.materials).toMatchObject([{ assumedConstant: true, voigtRangeNm: [633, 633] }]);
    expect(allowed.assumptions.join('\n')).toMatch(/Testium .* known at one wavelength only/);
  });

  it('is refused with every issue and its path, and nothing is stored', async () => {
    const before = await server.models.Run.count({ where: { groupId: people.group.id } });
    const material = await buildMaterial(server.models);
    const film = { id: 'film', medium: { material: material.id }, thicknessNm: 3 };
    const document = buildDocument({ layers: [film] });
    const far: SweepAxis = { kind: 'wavelength', from: 500, to: 900, points: 5, spacing: 'linear' };
    expect(await refused({ document, axis: far })).toEqual([
      { path: 'axis.to', message: expect.stringMatching(/Testium.*400 to 800 nm; 900 nm/) as string },
    ]);
    expect(
      await refused({ document: buildDocument({ layers: [{ ...film, medium: { material: 'nope' } }] }) }),
    ).toMatchObject([{ path: 'document.layers[0].medium' }]);
    expect(
      await refused({
        axis: { kind: 'thickness', layerId: 'no-such', from: 0, to: 1, points: 3, spacing: 'linear' },
      }),
    ).toMatchObject([{ path: 'axis.layerId' }]);
    expect(await refused({ axis: { ...angles, points: 1_000_001 } })).toMatchObject([
      { path: 'axis.points' },
    ]);
    expect(await refused({ document: buildDocument({ incident: { index: [1.5, 0.1] } }) })).toMatchObject([
      { path: 'document.incident.index' },
    ]);
    const several = await refused({
      document: buildDocument({ layers: [{ ...film, thicknessNm: -1 }], substrate: { index: [1, -1] } }),
      axis: { ...angles, to: 90 },
    });
    expect(several.map(({ path }) => path).sort()).toEqual([
      'axis.to',
      'document.layers[0].thicknessNm',
      'document.substrate.index',
    ]);
    expect(await server.models.Run.count({ where: { groupId: people.group.id } })).toBe(before);
  });

  it('refuses samples that a wavelength sweep would have to match', async () => {
    const layers = [
      {
        id: 'film',
        medium: { index: { samples: [[2, 3] as [number, number], [2, 3.1] as [number, number]] } },
        thicknessNm: 1,
      },
    ];
    const axis: SweepAxis = { kind: 'wavelength', from: 500, to: 600, points: 2, spacing: 'linear' };
    expect(await refused({ document: buildDocument({ layers }), axis })).toMatchObject([
      {
        path: 'document.layers[0].medium.index',
        message: expect.stringMatching(/cannot be swept/) as string,
      },
    ]);
  });

  it('starts once when it is sent twice with one key, also at the same time', async () => {
    const send = () => editor.post('/api/v1/runs').set('Idempotency-Key', 'press-1').send(requestOf());
    const [first, second] = (await Promise.all([send(), send()])) as { status: number; body: Run }[];
    expect([first!.status, second!.status]).toEqual([201, 201]);
    expect(second!.body.id).toBe(first!.body.id);
    await editor
      .post('/api/v1/runs')
      .set('Idempotency-Key', 'press-1')
      .send(requestOf({ axis: { ...angles, to: 70 } }))
      .expect(409);
    const owner = await server.signedIn(people.owner);
    const other = (await owner
      .post('/api/v1/runs')
      .set('Idempotency-Key', 'press-1')
      .send(requestOf())
      .expect(201)) as { body: Run };
    expect(other.body.id).not.toBe(first!.body.id);
  });

  it('can be started again from what it stored', async () => {
    const run = await finished();
    const { body: again } = (await editor.post(`/api/v1/runs/${run.id}/rerun`).expect(201)) as { body: Run };
    expect(again.id).not.toBe(run.id);
    expect(again.inputSha256).toBe(run.inputSha256);
    await waitForRun(server.models, again.id, 'done');
    expect(await dataOf(again.id)).toEqual(await dataOf(run.id));
  });
});

describe('downloads', () => {
  it('hand out the chosen readings in the order asked', async () => {
    const run = await finished({ readings: ['rotationP', 'reflectanceS', 'crossSp'] });
    const all = await dataOf(run.id);
    const some = await dataOf(run.id, '?readings=crossSp,rotationP');
    expect(some.header.readings.map(({ name }) => name)).toEqual(['crossSp', 'rotationP']);
    expect(some.columns.crossSp).toEqual(all.columns.crossSp);
    expect(some.columns.rotationP).toEqual(all.columns.rotationP);
    for (const wrong of ['contrastP', 'nonsense', '']) {
      const { body } = (await editor.get(`/api/v1/runs/${run.id}/data?readings=${wrong}`).expect(422)) as {
        body: { error: { issues: Issue[] } };
      };
      expect(body.error.issues[0]!.path).toMatch(/^readings/);
    }
  });

  it('write CSV that reads back to the same doubles', async () => {
    const run = await finished({ readings: ['rotationP', 'reflectanceS'], name: 'A name, with "marks"' });
    const response = await viewer.get(`/api/v1/runs/${run.id}/data.csv`).buffer(true).expect(200);
    expect(response.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(response.headers['content-disposition']).toBe('attachment; filename=A-name-with-marks.csv');
    const lines = response.text.split('\r\n');
    expect(lines[0]).toBe(
      'Angle of incidence (deg),"Kerr rotation, p light (deg)","Reflectance, s light (1)"',
    );
    expect(lines).toHaveLength(83);
    expect(lines[82]).toBe('');
    const { columns } = await dataOf(run.id);
    expect(lines.slice(1, 82).map((line) => Number(line.split(',')[1]))).toEqual([...columns.rotationP!]);
  });

  it('are refused while there are no numbers', async () => {
    const run = await buildRun(server.models, people.group, { state: 'failed' });
    await editor.get(`/api/v1/runs/${run.id}/data`).expect(409);
    await editor.get(`/api/v1/runs/${run.id}/data.csv`).expect(409);
  });

  it('leave an empty field where a reading does not exist', async () => {
    // Nothing reflects: no light comes back whose polarization could be told.
    const document = buildDocument({ layers: [], substrate: { index: 1 } });
    const run = await finished({ document, readings: ['rotationP', 'reflectanceP'] });
    const { text } = await editor.get(`/api/v1/runs/${run.id}/data.csv`).buffer(true).expect(200);
    expect(text.split('\r\n')[1]).toBe('0,,0');
    expect((await dataOf(run.id)).columns.rotationP!.every(Number.isNaN)).toBe(true);
  });
});

describe('a long run', () => {
  it('reports progress as events and is over at once when it is cancelled', async () => {
    const run = await start({ document: buildSlowDocument(), axis: endless, readings: ['rotationP'] });
    const events = await eventsUntil(run.id, async (seen) => {
      if (seen.filter(({ state }) => state === 'running').length < 3) return;
      const asked = performance.now();
      const response = await editor.post(`/api/v1/runs/${run.id}/cancel`).expect(200);
      expect(response.body).toMatchObject({ state: 'cancelled' });
      expect(performance.now() - asked).toBeLessThan(500);
    });
    expect(events[0]!.total).toBe(1_000_000);
    const counts = events.filter(({ state }) => state === 'running').map(({ done }) => done);
    expect(counts.at(-1)).toBeGreaterThan(0);
    expect(events.at(-1)).toMatchObject({ state: 'cancelled' });
    await editor.post(`/api/v1/runs/${run.id}/cancel`).expect(200);
    await editor.get(`/api/v1/runs/${run.id}/data`).expect(409);
    expect(await server.models.RunChunk.count({ where: { runId: run.id } })).toBe(0);
  });

  it('is dropped when it is deleted on the way', async () => {
    const run = await start({ document: buildSlowDocument(), axis: endless, readings: ['rotationP'] });
    await waitForRun(server.models, run.id, 'running');
    const events = eventsUntil(run.id, async (seen) => {
      if (seen.length === 1) await editor.delete(`/api/v1/runs/${run.id}`).expect(204);
    });
    expect((await events).at(-1)).toMatchObject({ state: 'cancelled', error: 'The run was deleted.' });
    await editor.get(`/api/v1/runs/${run.id}`).expect(404);
    // The cores are free for the next one.
    await finished();
  });

  it('ends the events of a run that is over, for a reader who comes late and for one who comes back', async () => {
    const run = await finished();
    const events = await eventsUntil(run.id, () => Promise.resolve());
    expect(events).toMatchObject([{ state: 'done', done: 81 }]);
    await editor.get(`/api/v1/runs/${run.id}/events`).set('Last-Event-ID', 'done').expect(204);
  });

  it('cannot be cancelled once it is done', async () => {
    const run = await finished();
    await editor.post(`/api/v1/runs/${run.id}/cancel`).expect(409);
  });
});

type Progress = Run['progress'];

/** Reads the events of a run until the server ends them. */
async function eventsUntil(runId: string, onEvent: (seen: Progress[]) => Promise<void>): Promise<Progress[]> {
  const seen: Progress[] = [];
  let failure: unknown;
  let acting = Promise.resolve();
  await editor
    .get(`/api/v1/runs/${runId}/events`)
    .buffer(true)
    .parse((response, done) => {
      let text = '';
      response.on('data', (chunk: Buffer) => {
        text += chunk.toString();
        const blocks = text.split('\n\n');
        text = blocks.pop()!;
        for (const block of blocks) {
          const data = /^data: (.*)$/m.exec(block)?.[1];
          if (data === undefined) continue;
          seen.push(JSON.parse(data) as Progress);
          const now = [...seen];
          acting = acting.then(() => onEvent(now)).catch((error: unknown) => void (failure = error));
        }
      });
      response.on('end', () => done(null, seen));
    })
    .expect(200)
    .expect('Content-Type', /^text\/event-stream/);
  await acting;
  if (failure) throw failure as Error;
  return seen;
}

describe('who may', () => {
  it('lets a viewer read and nothing else', async () => {
    const run = await finished();
    await viewer.get(`/api/v1/groups/${people.group.id}/runs`).expect(200);
    await viewer.get(`/api/v1/runs/${run.id}/data`).expect(200);
    await viewer.get(`/api/v1/runs/${run.id}/input.json`).expect(200);
    await viewer.post('/api/v1/runs').send(requestOf()).expect(403);
    await viewer.post(`/api/v1/runs/${run.id}/cancel`).expect(403);
    await viewer.post(`/api/v1/runs/${run.id}/rerun`).expect(403);
    await viewer.delete(`/api/v1/runs/${run.id}`).expect(403);
    await viewer.get(`/api/v1/runs/${run.id}`).expect(200);
  });

  it('hides everything from people outside of the group', async () => {
    const run = await finished();
    const paths = ['', '/events', '/data', '/data.csv', '/input.json', '/links'];
    for (const path of paths) {
      await stranger.get(`/api/v1/runs/${run.id}${path}`).expect(404);
      await server.anonymous().get(`/api/v1/runs/${run.id}${path}`).expect(401);
    }
    await stranger.get(`/api/v1/groups/${people.group.id}/runs`).expect(404);
    await stranger.post('/api/v1/runs').send(requestOf()).expect(404);
    await stranger.post(`/api/v1/runs/${run.id}/cancel`).expect(404);
    await stranger.delete(`/api/v1/runs/${run.id}`).expect(404);
    await editor.get('/api/v1/runs/not-an-id').expect(404);
  });

  it("does not take another group's stack or material into a run", async () => {
    const stack = await buildStack(server.models, people.strangersGroup);
    const { body } = (await editor
      .post('/api/v1/runs')
      .send({ ...requestOf(), stackId: stack.id })
      .expect(422)) as { body: { error: { issues: Issue[] } } };
    expect(body.error.issues).toMatchObject([{ path: 'stackId' }]);
    const material = await buildMaterial(server.models, { group: people.strangersGroup });
    const layers = [{ id: 'film', medium: { material: material.id }, thicknessNm: 1 }];
    expect(await refused({ document: buildDocument({ layers }) })).toMatchObject([
      { path: 'document.layers[0].medium' },
    ]);
  });

  it('lists the runs of a group, newest first, without their documents', async () => {
    const { group, owner } = await buildPeople(server.models);
    const old = await buildRun(server.models, group, { createdAt: new Date('2026-01-01') });
    const recent = await buildRun(server.models, group, { createdById: owner.id });
    const browser = await server.signedIn(owner);
    const { body } = (await browser.get(`/api/v1/groups/${group.id}/runs`).expect(200)) as {
      body: { runs: Run[] };
    };
    expect(body.runs.map(({ id }) => id)).toEqual([recent.id, old.id]);
    expect(body.runs[0]).toMatchObject({ createdBy: owner.name, axis: recent.input.axis });
    expect(body.runs[0]).not.toHaveProperty('document');
  });
});
