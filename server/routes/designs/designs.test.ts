import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import { z } from 'zod';
import type { DesignInput, DesignResult } from '../../../shared/design.ts';
import {
  designListSchema,
  designResultSchema,
  designSchema,
  sharedDesignSchema,
} from '../../../shared/design.ts';
import type { PointReadings } from '../../../shared/designPoint.ts';
import { createdLinkSchema, linkListSchema, sharedSubjectSchema } from '../../../shared/link.ts';
import { materialUsesSchema } from '../../../shared/materialEdit.ts';
import { runListSchema } from '../../../shared/run.ts';
import { stackSchema } from '../../../shared/stack.ts';
import type { StackMedium } from '../../../shared/stack.ts';
import { sensitivityAnswerSchema } from '../../../shared/toleranceDesign.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { designCalls } from '../../../tests/designCalls.ts';
import {
  buildCapInput,
  buildOptimiseInput,
  buildToleranceInput,
  polarPoint,
} from '../../../tests/designInputs.ts';
import {
  buildContent,
  buildDocument,
  buildMaterial,
  buildPeople,
  buildRun,
  buildStack,
} from '../../../tests/factories.ts';
import { waitForRun } from '../../../tests/waitForRun.ts';

let server: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let editor: TestAgent;
let viewer: TestAgent;
let stranger: TestAgent;
let anonymous: TestAgent;
let calls: ReturnType<typeof designCalls>;

beforeAll(async () => {
  server = await startApiServer();
  await server.dependencies.pool.warm();
  people = await buildPeople(server.models);
  editor = await server.signedIn(people.editor);
  viewer = await server.signedIn(people.viewer);
  stranger = await server.signedIn(people.stranger);
  anonymous = server.anonymous();
  calls = designCalls(editor, server.models, people.group.id);
});
afterAll(() => server.stop());

const ask = (input: DesignInput) => editor.post('/api/v1/designs').send({ groupId: people.group.id, input });

/** A search that nobody waits for: with two goals at many working points it lasts far longer than the tests. */
const endless = buildOptimiseInput({
  effort: 'thorough',
  second: { quantity: 'least reflectance' },
  points: [400, 450, 500, 550, 600, 650].map((wavelengthNm) => ({
    ...polarPoint,
    id: `at ${wavelengthNm}`,
    workingPoint: { ...polarPoint.workingPoint, wavelengthNm },
  })),
  document: buildDocument({
    layers: [
      ...buildDocument().layers,
      {
        id: 'block',
        repeat: 20,
        layers: [{ id: 'pair', medium: { index: [2.1, 3.2] }, thicknessNm: 1 }],
      },
    ],
  }),
  variables: ['cap', 'film', 'buffer'].map((layerId) => ({ layerId, fromNm: 1, toNm: 10 })),
});

function answerOf<Kind extends DesignResult['kind']>(result: DesignResult, kind: Kind) {
  if (result.kind !== kind) throw new Error(`An answer of kind ${result.kind}.`);
  // The check before tells which it is.
  return result as Extract<DesignResult, { kind: Kind }>;
}

/** Numbers of two solvers of the same formulas: to 1e-9 of themselves. */
function expectSame(found: Partial<PointReadings>, expected: Partial<PointReadings>): void {
  for (const [name, value] of Object.entries(expected)) {
    const other = found[name as keyof PointReadings];
    if (value === null) continue;
    expect(Math.abs(other! - value), name).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(value), 1e-6));
  }
}

describe('a cap design', () => {
  it('is stored with what it rests on, answered, and reproduced by its own input file', async () => {
    const stack = await buildStack(server.models, people.group);
    const asked = read(
      designSchema,
      await editor
        .post('/api/v1/designs')
        .send({ groupId: people.group.id, stackId: stack.id, input: buildCapInput() })
        .expect(201),
    );
    expect(asked).toMatchObject({ kind: 'cap', name: 'Pt/Co/Pt: cap of Pt, Oxide on Ti' });
    await waitForRun(server.models, asked.id, 'done');
    const done = read(designSchema, await viewer.get(`/api/v1/designs/${asked.id}`).expect(200));
    expect(done.progress).toMatchObject({ state: 'done', done: 200, total: 200 });
    const said = done.assumptions.join('\n');
    for (const part of [
      /take the place of Pt/,
      /rate error 3 %, one for each material/,
      /100 films drawn with seed 7/,
      /reflectance at least 0.2/,
      /632\.8 nm, angle of incidence 10 deg/,
      /first order/,
      /common practice/,
    ]) {
      expect(said).toMatch(part);
    }
    const result = answerOf(await calls.resultOf(asked.id), 'cap');
    expect(result.candidates.map(({ best }) => best === null)).toEqual([false, false]);

    const films = await calls.reproduced(asked.id);
    expect(films).toHaveLength(1 + 2 + 2 * 9);
    expectSame(films[0]!, result.bare[0]!.readings);
    result.candidates.forEach(({ best, points }, candidate) => {
      expectSame(films[1 + candidate]!, best!.points[0]!.readings);
      const curves = points[0]!;
      result.thicknessNm.forEach((_, at) => {
        expectSame(films[3 + 9 * candidate + at]!, {
          rotationDeg: curves.rotationDeg[at]!,
          ellipticityDeg: curves.ellipticityDeg[at]!,
          amplitude: curves.amplitude[at]!,
          reflectance: curves.reflectance[at]!,
          ceilingShare: curves.ceilingShare[at]!,
        });
      });
    });
  });

  it('with more films than a file should hold gives the best ones and the edges of the windows, and says so', async () => {
    const buffers = Array.from({ length: 100 }, (_, number) => ({
      id: `buffer ${number}`,
      medium: { index: [2.33, 4.14] as [number, number], label: 'Pt' },
      thicknessNm: 0.05,
    }));
    const document = buildDocument();
    document.layers.splice(2, 1, ...buffers);
    const range = { fromNm: 1, toNm: 9, points: 300 };
    const { id } = await calls.finished(buildCapInput({ document, range }));
    const file = await editor.get(`/api/v1/designs/${id}/input.json`).buffer(true).expect(200);
    expect(file.headers['content-disposition']).toContain('-input-without-curves.json');
    const { candidates } = answerOf(await calls.resultOf(id), 'cap');
    const films = await calls.reproduced(id);
    const windows = candidates.flatMap((candidate) => candidate.windows);
    expect(windows.length).toBeGreaterThan(0);
    expect(films).toHaveLength(1 + 2 + 2 * windows.length);
    candidates.forEach(({ best }, at) => expectSame(films[1 + at]!, best!.points[0]!.readings));
  });

  it('is handed out as CSV with the sources of its constants', async () => {
    const material = await buildMaterial(server.models, { group: people.group });
    const input = buildCapInput();
    input.candidates[0]!.layers[0]!.medium = { material: material.id };
    input.points = [{ ...polarPoint, workingPoint: { ...polarPoint.workingPoint, wavelengthNm: 600 } }];
    const { id, materials } = await calls.finished(input);
    expect(materials).toMatchObject([{ id: material.id, version: 1 }]);
    const { text } = await editor.get(`/api/v1/designs/${id}/result.csv`).buffer(true).expect(200);
    const lines = text.trimEnd().split('\r\n');
    expect(lines.find((line) => line.startsWith('# '))).toContain('Invented for a test');
    const table = lines.filter((line) => !line.startsWith('# '));
    expect(table[0]).toMatch(/^Candidate,Working point,Thickness \(nm\),Kerr rotation \(deg\)/);
    expect(table).toHaveLength(1 + 2 * 9);
    const result = answerOf(await calls.resultOf(id), 'cap');
    expect(Number(table[1]!.split(',')[3])).toBe(result.candidates[0]!.points[0]!.rotationDeg[0]);
  });

  it('says at its place what keeps it from being answered', async () => {
    const { candidates, tolerance } = buildCapInput();
    const unknown = candidates.map((candidate, position) =>
      position === 1
        ? {
            ...candidate,
            layers: candidate.layers.map((layer) => ({ ...layer, medium: { material: 'nope' } })),
          }
        : candidate,
    );
    const refused = async (input: DesignInput) => issuePaths(await ask(input).expect(422));
    expect(await refused(buildCapInput({ candidates: unknown }))).toEqual([
      'input.candidates[1].layers[0].medium.material',
      'input.candidates[1].layers[1].medium.material',
    ]);
    expect(await refused(buildCapInput({ replaces: ['film'] }))).toEqual(['input.replaces[0]']);
    expect(await refused(buildCapInput({ replaces: ['gone'] }))).toEqual(['input.replaces[0]']);
    const twice = candidates.map((candidate) => ({ ...candidate, id: 'same' }));
    expect(await refused(buildCapInput({ candidates: twice }))).toEqual(['input.candidates[1].id']);
    const many = buildCapInput({
      tolerance: {
        ...tolerance,
        samples: 20_000,
        materials: [{ material: 'nothing', ratePercent: 1 }],
      },
      range: { fromNm: 1, toNm: 9, points: 400 },
      points: [1, 2].map((number) => ({ ...polarPoint, id: String(number) })),
    });
    const { issues } = refusalOf(await ask(many).expect(422));
    expect(issues!.map(({ path }) => path)).toEqual([
      'input.tolerance.samples',
      'input.tolerance.materials[0].material',
    ]);
    expect(issues![0]!.message).toMatch(/16000000: take fewer/);
    // The table of this material begins at 400 nm.
    const material = await buildMaterial(server.models, { group: people.group });
    const document = buildDocument();
    document.substrate = { material: material.id };
    const far = { ...polarPoint, workingPoint: { ...polarPoint.workingPoint, wavelengthNm: 300 } };
    expect(await refused(buildCapInput({ document, points: [far] }))).toEqual(['input.document.substrate']);
    const slab = buildDocument({ backside: { thicknessNm: 1e5, exit: { index: 1 } } });
    expect(await refused(buildCapInput({ document: slab, signal: 'amplitude' }))).toEqual(['input.signal']);
    expect(await refused(buildOptimiseInput({ goal: { quantity: 'insensitivity', layerId: 'x' } }))).toEqual([
      'input.goal.layerId',
    ]);
  });
});

describe('an optimisation', () => {
  it('tells what it has found and is reproduced by its own input file', async () => {
    const { id, progress, kind } = await calls.finished(buildOptimiseInput());
    expect(kind).toBe('optimise');
    expect(progress.done).toBe(progress.total);
    const result = answerOf(await calls.resultOf(id), 'optimise');
    const [start, best] = await calls.reproduced(id);
    expect(Math.abs(start!.rotationDeg!)).toBeCloseTo(result.start.value!, 9);
    expect(Math.abs(best!.rotationDeg!)).toBeCloseTo(result.best.value!, 9);
    expect(result.best.value!).toBeGreaterThanOrEqual(result.start.value!);
    expectSame(best!, result.best.points[0]!.readings);
    const { text } = await editor.get(`/api/v1/designs/${id}/result.csv`).buffer(true).expect(200);
    expect(text).toContain('"Thickness of Pt, layer 1 (nm)",|Kerr rotation| (deg),Kerr rotation at Polar');
    const { thicknessesNm, value, points } = result.best;
    const { rotationDeg, ellipticityDeg } = points[0]!.readings;
    expect(text.trimEnd().split('\r\n').at(-1)).toContain(
      `best,,${thicknessesNm[0]},${value},${rotationDeg},${ellipticityDeg},`,
    );
  });

  it('shows the best film so far while it is computed here, and ends when it is cancelled', async () => {
    const { id } = await calls.start(endless);
    await waitForRun(server.models, id, 'running');
    await editor.get(`/api/v1/designs/${id}/result`).expect(409);
    const deadline = performance.now() + 20_000;
    let status = 409;
    while (status !== 200 && performance.now() < deadline) {
      const answer = await editor.get(`/api/v1/designs/${id}/result?partial=true`);
      status = answer.status;
      if (status === 200) expect(read(designResultSchema, answer)).toMatchObject({ kind: 'optimise' });
    }
    expect(status).toBe(200);
    await viewer.post(`/api/v1/designs/${id}/cancel`).expect(403);
    const { body } = (await editor.post(`/api/v1/designs/${id}/cancel`).expect(200)) as { body: unknown };
    expect(body).toMatchObject({ state: 'cancelled' });
    // What it had found is kept once its host has seen that it was cancelled.
    await expect.poll(() => server.models.RunChunk.count({ where: { runId: id } })).toBe(1);
    const kept = await editor.get(`/api/v1/designs/${id}/result?partial=true`).expect(200);
    expect(read(designResultSchema, kept)).toMatchObject({ kind: 'optimise', ended: 'unfinished' });
    await editor.get(`/api/v1/designs/${id}/result`).expect(409);
    await editor.post(`/api/v1/designs/${id}/links`).send({}).expect(409);
    const events = await editor.get(`/api/v1/designs/${id}/events`).buffer(true).expect(200);
    expect(events.text).toContain('"state":"cancelled"');
    const actions = await server.models.Activity.findAll({ where: { subjectId: id }, order: ['id'] });
    expect(actions.map(({ action }) => action)).toEqual(['design.create', 'design.cancel']);
  });
});

describe('a tolerance', () => {
  it('is answered, repeats, and is reproduced by its own input file', async () => {
    const { id, inputSha256 } = await calls.finished(buildToleranceInput());
    const result = answerOf(await calls.resultOf(id), 'tolerance');
    const [nominal] = await calls.reproduced(id);
    const { contrast: _contrast, ceilingShare: _share, ...plain } = result.points[0]!.nominal;
    expectSame(nominal!, plain);
    await editor.post(`/api/v1/designs/${id}/cancel`).expect(409);
    const again = read(designSchema, await editor.post(`/api/v1/designs/${id}/rerun`).expect(201));
    expect(again.inputSha256).toBe(inputSha256);
    await waitForRun(server.models, again.id, 'done');
    expect(await calls.resultOf(again.id)).toEqual(result);
    const { text } = await editor.get(`/api/v1/designs/${id}/result.csv`).buffer(true).expect(200);
    expect(text).toContain('# Films that meet reflectance at least 0.2 alone: ');
    expect(text).toContain('Derivative by thickness of Co (unit per nm)');
    const reflectance = text.split('\r\n').find((row) => row.includes(',Reflectance,'))!;
    expect(Number(reflectance.split(',')[3])).toBe(result.points[0]!.nominal.reflectance);
  });

  it('keeps the errors of a typed material however the database orders its keys', async () => {
    const medium: StackMedium = { voigt: [0.03, 0.01], index: [2.25, 4.07] };
    const document = buildDocument({ layers: [{ id: 'film', medium, thicknessNm: 5, m: [0, 0, 1] }] });
    const base = buildToleranceInput();
    const none = { ...base.tolerance, ratePercent: 0, randomPercent: 0 };
    const materials = [{ material: '{"index":[2.25,4.07],"voigt":[0.03,0.01]}', ratePercent: 5 }];
    const { id } = await calls.finished({ ...base, document, tolerance: { ...none, materials } });
    const result = answerOf(await calls.resultOf(id), 'tolerance');
    expect(result.points[0]!.distributions.reflectance!.deviation).toBeGreaterThan(1e-4);
  });
});

describe('a design', () => {
  it('is no run, and a run is no design', async () => {
    const { id } = await calls.finished(buildToleranceInput());
    const run = await buildRun(server.models, people.group, { state: 'failed' });
    await editor.get(`/api/v1/runs/${id}`).expect(404);
    await editor.delete(`/api/v1/runs/${id}`).expect(404);
    await editor.get(`/api/v1/designs/${run.id}`).expect(404);
    const runs = read(runListSchema, await viewer.get(`/api/v1/groups/${people.group.id}/runs`).expect(200));
    expect(runs.runs.map((one) => one.id)).toEqual([run.id]);
    const list = read(
      designListSchema,
      await viewer.get(`/api/v1/groups/${people.group.id}/designs`).expect(200),
    );
    expect(list.designs.map((one) => one.id)).toContain(id);
    expect(list.designs.map((one) => one.id)).not.toContain(run.id);
  });

  it('whose answer is not finite fails once and for all, and says where', async () => {
    // A factor on Q that the schema allows and no arithmetic survives.
    const document = buildDocument();
    document.layers[1] = { ...document.layers[1]!, voigtScale: 1e300 };
    const { id } = await calls.start(buildToleranceInput({ document }));
    const failed = await waitForRun(server.models, id, 'failed');
    expect(failed.attempts).toBe(1);
    expect(failed.error).toMatch(/not finite \(.+\): a thickness, wavelength or constant/);
    await editor.get(`/api/v1/designs/${id}/result`).expect(409);
  });

  it('is asked once with an idempotency key', async () => {
    const twice = () => ask(buildToleranceInput()).set('Idempotency-Key', 'one question');
    const first = read(designSchema, await twice().expect(201));
    expect(read(designSchema, await twice().expect(201)).id).toBe(first.id);
    await ask(buildToleranceInput({ signal: 'ellipticity' }))
      .set('Idempotency-Key', 'one question')
      .expect(409);
  });

  it('is asked and changed by editors, read by members, and not there for others', async () => {
    const { id } = await calls.finished(buildToleranceInput());
    const body = { groupId: people.group.id, input: buildToleranceInput() };
    await viewer.post('/api/v1/designs').send(body).expect(403);
    await stranger.post('/api/v1/designs').send(body).expect(404);
    await anonymous.post('/api/v1/designs').send(body).expect(401);
    for (const part of ['', '/result', '/result.csv', '/input.json', '/events']) {
      await viewer.get(`/api/v1/designs/${id}${part}`).buffer(true).expect(200);
      await stranger.get(`/api/v1/designs/${id}${part}`).expect(404);
      await anonymous.get(`/api/v1/designs/${id}${part}`).expect(401);
    }
    await viewer.post(`/api/v1/designs/${id}/rerun`).expect(403);
    await viewer.post(`/api/v1/designs/${id}/links`).send({}).expect(403);
    await viewer.delete(`/api/v1/designs/${id}`).expect(403);
    await stranger.delete(`/api/v1/designs/${id}`).expect(404);
    const theirs = await buildMaterial(server.models, { group: people.strangersGroup });
    const document = buildDocument();
    document.substrate = { material: theirs.id };
    expect(issuePaths(await ask(buildToleranceInput({ document })).expect(422))).toEqual([
      'input.document.substrate',
    ]);
    const stack = await buildStack(server.models, people.strangersGroup);
    const refused = await editor
      .post('/api/v1/designs')
      .send({ ...body, stackId: stack.id })
      .expect(422);
    expect(issuePaths(refused)).toEqual(['stackId']);
  });

  it('is opened by a link with its answer, and nothing else of the group', async () => {
    const { id, inputSha256 } = await calls.finished(buildCapInput());
    const { url } = read(
      createdLinkSchema,
      await editor.post(`/api/v1/designs/${id}/links`).send({}).expect(201),
    );
    const shared = `/api/v1/shared/${url.split('/').at(-1)}`;
    expect(read(sharedSubjectSchema, await anonymous.get(`${shared}/subject`).expect(200))).toEqual({
      opens: 'design',
    });
    const answer = await anonymous.get(`${shared}/design`).expect(200);
    const { input, inputSha256: shown } = read(z.strictObject(sharedDesignSchema.shape), answer);
    expect(shown).toBe(inputSha256);
    expect(input.kind).toBe('cap');
    for (const secret of [people.group.id, people.editor.name, id]) expect(answer.text).not.toContain(secret);
    const result = read(designResultSchema, await anonymous.get(`${shared}/result`).expect(200));
    expect(result).toEqual(await calls.resultOf(id));
    await anonymous.get(`${shared}/result.csv`).buffer(true).expect(200);
    await anonymous.get(`${shared}/input.json`).buffer(true).expect(200);
    await anonymous.get(shared).expect(404);
    await anonymous.get(`${shared}/data`).expect(404);
    const open = () => stranger.post(`${shared}/stacks`).send({ groupId: people.strangersGroup.id });
    const opened = read(stackSchema, await open().expect(201));
    expect(opened.document).toEqual({ ...buildDocument(), workingPoint: polarPoint.workingPoint });
    expect(opened.description).toContain('From the shared design');
    const links = read(linkListSchema, await editor.get(`/api/v1/designs/${id}/links`).expect(200));
    expect(links.links).toMatchObject([{ opens: 'design', subjectId: id, useCount: 1 }]);
    await editor.delete(`/api/v1/designs/${id}`).expect(204);
    for (const part of ['subject', 'design', 'result', 'result.csv', 'input.json']) {
      await anonymous.get(`${shared}/${part}`).expect(410);
    }
    await open().expect(410);
  });

  it('uses the version of a material that was the newest when it was asked', async () => {
    const contents = [buildContent(), buildContent({ voigt: null, voigtSource: null })];
    const material = await buildMaterial(server.models, { contents });
    const document = buildDocument();
    document.substrate = { material: material.id };
    const { id, name, input } = await calls.start(buildToleranceInput({ document }));
    expect(input.document.substrate).toEqual({ material: material.id, version: 2 });
    // Every thing that rests on a material is named among its uses, which keep it from being deleted.
    const uses = read(
      materialUsesSchema,
      await editor.get(`/api/v1/materials/${material.id}/uses`).expect(200),
    );
    expect(uses.designs).toEqual([{ id, name, versions: [2] }]);
    expect(uses.runs).toEqual([]);
  });
});

describe('derivatives', () => {
  it('are answered at once for a film of library materials', async () => {
    const material = await buildMaterial(server.models, { group: people.group });
    const document = buildDocument();
    document.substrate = { material: material.id };
    const body = { document, points: [polarPoint] };
    const answer = read(
      sensitivityAnswerSchema,
      await editor.post('/api/v1/sensitivity').send(body).expect(200),
    );
    expect(answer.sensitivities.map(({ label }) => label)).toContain('n of Te');
    // Between two solves 0.02 nm apart the derivative is the slope: its definition.
    const shifted = async (nm: number) => {
      const moved = structuredClone(document);
      moved.layers[0] = { ...moved.layers[0]!, thicknessNm: 3 + nm };
      const { readings } = read(
        sensitivityAnswerSchema,
        await editor
          .post('/api/v1/sensitivity')
          .send({ ...body, document: moved })
          .expect(200),
      );
      return readings[0]!.readings.reflectance;
    };
    const slope = ((await shifted(0.01)) - (await shifted(-0.01))) / 0.02;
    const found = answer.sensitivities.find(({ of, parameter }) => of === 'cap' && parameter === 'thickness');
    expect(found!.derivative.reflectance! / slope).toBeCloseTo(1, 4);
    await anonymous.post('/api/v1/sensitivity').send(body).expect(401);
    expect(issuePaths(await stranger.post('/api/v1/sensitivity').send(body).expect(422))).toEqual([
      'document.substrate',
    ]);
    const layers = Array.from({ length: 201 }, (_, number) => ({
      id: String(number),
      medium: { index: 2 },
      thicknessNm: 1,
    }));
    const large = await editor
      .post('/api/v1/sensitivity')
      .send({ ...body, document: { ...document, layers } });
    expect(large.status).toBe(422);
    expect(issuePaths(large)).toEqual(['document.layers']);
  });
});
