import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { angleFeaturesSchema } from '../../../shared/live.ts';
import { LIMITS } from '../../../shared/limits.ts';
import { readStrip, stripRequest } from '../../../shared/readingsStrip.ts';
import { decodeResult } from '../../../shared/resultFormat.ts';
import { solveResponseSchema } from '../../../shared/solve.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { toSolveCase } from '../../../shared/stackCase.ts';
import { issuePaths, read } from '../../../tests/answers.ts';
import type { ApiServer, Browser } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildMaterial, buildPeople } from '../../../tests/factories.ts';

let api: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let browser: Browser;
beforeAll(async () => (api = await startApiServer()));
beforeEach(async () => {
  people = await buildPeople(api.models);
  browser = await api.signedIn(people.viewer);
});
afterAll(() => api.stop());

// The example of the solve contract (contract.md), without its library-free block.
const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { index: [0.12, 3.29] }, thicknessNm: 2 },
    {
      id: 'film',
      medium: { index: [2.87, 3.36], voigt: [0.0376, 0.0066] },
      thicknessNm: 10,
      m: [0, 0, 1],
    },
  ],
  substrate: { index: [3.88, 0.02] },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 60, input: 'p', magnetization: { mode: 'drawn' } },
};
const angles = { kind: 'angle', from: 0, to: 85, points: 18, spacing: 'linear' } as const;
const curve = (body: object) =>
  browser
    .post('/api/v1/live-curve')
    .send({ document, axis: angles, readings: ['rotationP', 'reflectanceS'], ...body });

async function decoded(asked: ReturnType<typeof curve>) {
  const answer = await asked.buffer(true).parse((response, done) => {
    const pieces: Buffer[] = [];
    response.on('data', (piece: Buffer) => pieces.push(piece));
    response.on('end', () => done(null, Buffer.concat(pieces)));
  });
  expect(answer.status).toBe(200);
  return decodeResult(Uint8Array.from(answer.body as Buffer).buffer);
}

describe('a live curve', () => {
  test('has the numbers that the solve route gives', async () => {
    const { axis, columns, header } = await decoded(curve({}));
    const asked = toSolveCase(document, 632.8, [...axis]);
    const solved = read(
      solveResponseSchema,
      await browser
        .post('/api/v1/solve')
        .send({ cases: [asked] })
        .expect(200),
    ).results[0]!.points;
    expect(header.pointCount).toBe(18);
    solved.forEach(({ kerr, R }, index) => {
      // Polar film of isotropic media: at m = 0 nothing turns (physics.md section 4).
      expect(columns.rotationP![index]).toBeCloseTo(kerr.p!.rotationDeg, 9);
      expect(columns.reflectanceS![index]).toBeCloseTo(R.s, 12);
    });
  });

  test('brings the readings at the working point along when it is asked to', async () => {
    const { header } = await decoded(curve({ strip: true }));
    const alone = await browser
      .post('/api/v1/solve')
      .send(stripRequest(document, document.workingPoint))
      .expect(200);
    expect(header.strip).toEqual(readStrip(read(solveResponseSchema, alone)));
    expect(header.strip?.readings.rotationP).not.toBeNull();
    expect((await decoded(curve({}))).header.strip).toBeUndefined();
  });

  test('says every problem at its field of the document', async () => {
    const many = await curve({ axis: { ...angles, points: LIMITS.liveCurvePoints + 1 } }).expect(422);
    expect(issuePaths(many)).toEqual(['axis.points']);
    const layer = await curve({ axis: { ...angles, kind: 'thickness', layerId: 'none' } }).expect(422);
    expect(issuePaths(layer)).toEqual(['axis.layerId']);
    const foreign = await buildMaterial(api.models);
    const unknown = { ...document, substrate: { material: 'not there' } };
    expect(issuePaths(await curve({ document: unknown }).expect(422))).toEqual(['document.substrate']);
    const absorbing = { ...document, incident: { material: foreign.id } };
    const [path] = issuePaths(await curve({ document: absorbing }).expect(422));
    expect(path).toMatch(/^document\.incident/);
  });

  test('is for people who are signed in', async () => {
    await api.anonymous().post('/api/v1/live-curve').send({}).expect(401);
  });
});

describe('angle features', () => {
  test('of bare glass are its Brewster angle', async () => {
    const glass = { ...document, layers: [], substrate: { index: 1.5 } };
    const answer = await browser.post('/api/v1/angle-features').send({ document: glass }).expect(200);
    const { pseudoBrewster, signChanges } = read(angleFeaturesSchema, answer);
    // Brewster (1815): tan(theta) = n.
    expect(pseudoBrewster!.angleDeg).toBeCloseTo((Math.atan(1.5) * 180) / Math.PI, 7);
    expect(signChanges).toEqual([]);
  });
});
