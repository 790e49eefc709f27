import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { createdTokenSchema } from '../../../shared/account.ts';
import { LIMITS } from '../../../shared/limits.ts';
import { solveResponseSchema } from '../../../shared/solve.ts';
import { issuePaths, read, refusalOf } from '../../../tests/answers.ts';
import type { ApiServer, Browser } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildContent, buildMaterial, buildPeople } from '../../../tests/factories.ts';

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
const film = { thicknessNm: 10, index: [2.87, 3.36], voigt: [0.0376, 0.0066], m: [0, 0, 1] };
const exampleCase = {
  wavelengthNm: 632.8,
  angleDeg: 60,
  incident: { index: 1 },
  layers: [{ thicknessNm: 2, index: [0.12, 3.29] }, film],
  substrate: { index: [3.88, 0.02] },
};

const post = (cases: object[]) => browser.post('/api/v1/solve').send({ cases });

describe('a request of numbers', () => {
  test('is answered as the contract says, without `resolved`', async () => {
    const { results, warnings } = read(solveResponseSchema, await post([exampleCase]).expect(200));
    expect(results).toHaveLength(1);
    expect(results[0]?.points).toHaveLength(1);
    expect(results[0]?.resolved).toBeUndefined();
    expect(warnings ?? []).toEqual([]);
    const [point] = results[0]!.points;
    // Energy: what is not reflected or transmitted is absorbed (physics.md section 3).
    expect(point!.R.p + point!.T.p + point!.A.p).toBeCloseTo(1, 12);
    // Polar symmetry r_sp = r_ps (physics.md section 3).
    expect(point!.r!.sp[0]).toBeCloseTo(point!.r!.ps[0], 12);
  });

  test('stands for every pair of wavelength and angle, wavelength outermost', async () => {
    const answer = await post([{ ...exampleCase, wavelengthNm: [600, 700], angleDeg: [0, 45] }]).expect(200);
    const points = read(solveResponseSchema, answer).results[0]!.points;
    expect(points.map((point) => [point.wavelengthNm, point.angleDeg])).toEqual([
      [600, 0],
      [600, 45],
      [700, 0],
      [700, 45],
    ]);
  });

  test('says what is allowed but probably not meant', async () => {
    const { m: _m, ...unmagnetized } = film;
    const answer = await post([{ ...exampleCase, layers: [unmagnetized] }]).expect(200);
    expect(read(solveResponseSchema, answer).warnings?.map((warning) => warning.path)).toEqual([
      'cases[0].layers[0].voigt',
    ]);
  });
});

describe('media of the library', () => {
  test('are resolved, and what was used solves to the same numbers', async () => {
    const { id } = await buildMaterial(api.models);
    const layers = [{ thicknessNm: 10, material: id, m: [0, 0, 1] }];
    const answer = await post([{ ...exampleCase, wavelengthNm: [500, 600], layers }]).expect(200);
    const [result] = read(solveResponseSchema, answer).results;
    expect(result?.resolved).toBeDefined();
    expect(JSON.stringify(result?.resolved)).not.toContain(id);
    const again = read(solveResponseSchema, await post([result!.resolved!]).expect(200));
    expect(again.results[0]?.points).toEqual(result?.points);
  });

  test('take the version that is named, else the newest', async () => {
    const heavier = buildContent({
      index: { kind: 'table', wavelengthsNm: [400, 800], n: [3, 3], k: [1, 1] },
    });
    const { id } = await buildMaterial(api.models, { contents: [buildContent(), heavier] });
    const solve = async (medium: object) => {
      const answer = await post([{ ...exampleCase, layers: [{ thicknessNm: 10, ...medium }] }]).expect(200);
      return read(solveResponseSchema, answer).results[0]?.resolved?.layers[0];
    };
    expect(await solve({ material: id })).toMatchObject({ index: [3, 1] });
    expect(await solve({ material: id, version: 2 })).toMatchObject({ index: [3, 1] });
    expect(await solve({ material: id, version: 1 })).not.toMatchObject({ index: [3, 1] });
  });

  test('of another group, unknown ones and wavelengths out of range are refused at their place', async () => {
    const foreign = await buildMaterial(api.models, { group: people.strangersGroup });
    const own = await buildMaterial(api.models, { group: people.group });
    const layers = [
      { thicknessNm: 1, material: foreign.id },
      { thicknessNm: 1, material: 'no-such' },
      { thicknessNm: 1, material: own.id, version: 9 },
    ];
    const refused = await post([exampleCase, { ...exampleCase, layers }]).expect(422);
    expect(issuePaths(refused)).toEqual([0, 1, 2].map((position) => `cases[1].layers[${position}].material`));
    const [hidden, unknown] = refusalOf(refused).issues!.map((issue) => issue.message);
    expect(hidden!.replace(foreign.id, 'no-such')).toBe(unknown);
    const far = await post([
      { ...exampleCase, wavelengthNm: 900, layers: [{ thicknessNm: 1, material: own.id }] },
    ]).expect(422);
    expect(refusalOf(far).issues?.[0]?.message).toMatch(/Testium.*400 to 800 nm.*900 nm/);
    await post([{ ...exampleCase, layers: [{ thicknessNm: 1, material: own.id }] }]).expect(200);
  });

  test('are found in the parts of a mixture', async () => {
    const { id } = await buildMaterial(api.models);
    const mixture = { model: 'bruggeman', fraction: 0.5, parts: [{ index: [0.18, 3.43] }, { material: id }] };
    const solve = () => post([{ ...exampleCase, layers: [{ thicknessNm: 2, mixture }] }]);
    const [result] = read(solveResponseSchema, await solve().expect(200)).results;
    expect(JSON.stringify(result?.resolved)).toContain('bruggeman');
    expect(JSON.stringify(result?.resolved)).not.toContain(id);
    await api.models.Material.destroy({ where: { id } });
    expect(issuePaths(await solve().expect(422))).toEqual(['cases[0].layers[0].mixture.parts[1].material']);
  });

  test('must keep the rules of a case too', async () => {
    const absorbing = await buildMaterial(api.models);
    const refused = await post([{ ...exampleCase, incident: { material: absorbing.id } }]).expect(422);
    expect(issuePaths(refused)).toEqual(['cases[0].incident.index']);
    expect(refusalOf(refused).issues?.[0]?.message).toContain('must not absorb');
  });
});

describe('refused', () => {
  test('every mistake at once, with its path', async () => {
    const answer = await post([
      exampleCase,
      {
        ...exampleCase,
        wavelengthNm: 0,
        angleDeg: 90,
        layers: [
          { thicknessNm: -2, index: [1, -1] },
          { repeat: 1.5, layers: [] },
          { thicknessNm: 1, idnex: 2 },
        ],
      },
    ]).expect(422);
    expect(issuePaths(answer)).toEqual(
      expect.arrayContaining([
        'cases[1].angleDeg',
        'cases[1].layers[0].index',
        'cases[1].layers[0].thicknessNm',
        'cases[1].layers[1].repeat',
        'cases[1].layers[2].idnex',
        'cases[1].wavelengthNm',
      ]),
    );
  });

  test('more points than one request takes: start a run', async () => {
    const wavelengthNm = Array.from({ length: 201 }, (_, index) => 400 + index);
    const angleDeg = Array.from({ length: 100 }, (_, index) => index / 2);
    const answer = await post([{ ...exampleCase, wavelengthNm, angleDeg }]).expect(422);
    expect(refusalOf(answer).issues?.[0]?.message).toMatch(new RegExp(`${LIMITS.httpPoints}.*20100.*run`));
  });

  test('outputs that do not exist', async () => {
    const answer = await post([{ ...exampleCase, outputs: ['mueler'] }]).expect(422);
    expect(issuePaths(answer)).toEqual(['cases[0].outputs[0]']);
    await post([{ ...exampleCase, outputs: ['mueller'] }]).expect(200);
  });

  test('nobody without a session; an API token will do', async () => {
    const anonymous = api.anonymous();
    await anonymous
      .post('/api/v1/solve')
      .send({ cases: [exampleCase] })
      .expect(401);
    const created = await browser.post('/api/v1/tokens').send({ name: 'script' }).expect(201);
    const { token } = read(createdTokenSchema, created);
    await anonymous
      .post('/api/v1/solve')
      .set('Authorization', `Bearer ${token}`)
      .send({ cases: [exampleCase] })
      .expect(200);
  });
});
