import { createServer, request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { materialSchema } from '../../../shared/material.ts';
import { materialVersionListSchema } from '../../../shared/materialEdit.ts';
import { fitResultSchema } from '../../../shared/materialFit.ts';
import { issuePaths, read } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { PASSWORD, buildContent, buildMaterial, buildPeople } from '../../../tests/factories.ts';

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

const address = () => `/api/v1/groups/${people.group.id}/fits`;
const wavelengthsNm = Array.from({ length: 41 }, (_, i) => 400 + 10 * i);
/** Cauchy: n = 1.5 + 0.004 / L^2, L in micrometres. */
const cauchy = () =>
  buildMaterial(api.models, {
    group: people.group,
    contents: [
      buildContent({
        voigt: null,
        voigtSource: null,
        index: {
          kind: 'table',
          wavelengthsNm,
          n: wavelengthsNm.map((nm) => 1.5 + 0.004 / (nm / 1000) ** 2),
          k: wavelengthsNm.map(() => 0),
        },
      }),
    ],
  });
const formula = {
  kind: 'formula',
  expression: 'c1 + c2 / L^2',
  coefficients: [1.4, 0.01],
  rangeNm: [400, 800],
};

test('a fit gives the parameters that made the table, by whoever reads the group', async () => {
  const { id } = await cauchy();
  const body = { material: id, version: 1, target: 'index', start: formula };
  const viewer = await api.signedIn(people.viewer);
  const { parameters, points, deviation } = read(
    fitResultSchema,
    await viewer.post(address()).send(body).expect(200),
  );
  expect(points).toBe(41);
  expect(deviation).toBeLessThan(1e-8);
  // those of `cauchy`
  expect(parameters[0]!.value).toBeCloseTo(1.5, 7);
  expect(parameters[1]!.value).toBeCloseTo(0.004, 7);
  await (await api.signedIn(people.stranger)).post(address()).send(body).expect(404);
  await api.anonymous().post(address()).send(body).expect(401);
  const foreign = await buildMaterial(api.models, { group: people.strangersGroup });
  for (const material of [foreign.id, 'no-such']) {
    const answer = await editor
      .post(address())
      .send({ ...body, material })
      .expect(422);
    expect(issuePaths(answer)).toEqual(['material']);
  }
  const unknown = await editor
    .post(address())
    .send({ ...body, fixed: ['c9'] })
    .expect(422);
  expect(issuePaths(unknown)[0]).toMatch(/^fixed/);
});

test('whoever hangs up frees the fit: a third one is refused only while two are waited for', async () => {
  const { id } = await cauchy();
  // Every step of it evaluates what takes long.
  const slow = {
    ...formula,
    expression: `c1 + c2 * (${Array.from({ length: 60 }, (_, i) => `sin(L * ${i + 1})`).join(' + ')})`,
  };
  const body = JSON.stringify({ material: id, version: 1, target: 'index', start: slow });
  const fits = vi.spyOn(api.dependencies.pool, 'fit');
  const server = createServer(api.app).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  try {
    const { port } = server.address() as AddressInfo;
    const signIn = await fetch(`http://127.0.0.1:${port}/api/v1/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({ email: people.editor.email, password: PASSWORD }),
    });
    const cookie = signIn.headers
      .getSetCookie()
      .map((one) => one.split(';')[0])
      .join('; ');
    const asked = httpRequest({
      port,
      host: '127.0.0.1',
      path: address(),
      method: 'POST',
      headers: { Cookie: cookie, 'Content-Type': 'application/json' },
    });
    asked.on('error', () => undefined);
    asked.end(body);
    await vi.waitFor(() => expect(fits).toHaveBeenCalledTimes(1), { timeout: 10_000 });
    const signal = fits.mock.calls[0]![1]!.signal!;
    expect(signal.aborted).toBe(false);
    asked.destroy();
    await vi.waitFor(() => expect(signal.aborted).toBe(true), { timeout: 10_000 });
    const ended = { type: 'rejected', value: { failure: 'cancelled' } };
    await vi.waitFor(() => expect(fits.mock.settledResults[0]).toMatchObject(ended), { timeout: 10_000 });
  } finally {
    fits.mockRestore();
    server.closeAllConnections();
    server.close();
  }
  const again = { material: id, version: 1, target: 'index', start: formula };
  await editor.post(address()).send(again).expect(200);
});

test('a new name makes no version and is refused to viewers', async () => {
  const { id } = await cauchy();
  const one = `/api/v1/materials/${id}`;
  const naming = { name: 'Glass, ours', formula: 'SiO2', class: 'dielectric', notes: ['from the shelf'] };
  const renamed = read(materialSchema, await editor.patch(one).send(naming).expect(200));
  expect(renamed).toMatchObject({ ...naming, version: 1 });
  expect(read(materialVersionListSchema, await editor.get(`${one}/versions`)).versions).toHaveLength(1);
  const logged = await api.models.Activity.findOne({ where: { subjectId: id, action: 'material.rename' } });
  expect(logged?.detail).toMatchObject({ name: 'Glass, ours' });
  expect(
    issuePaths(
      await editor
        .patch(one)
        .send({ ...naming, name: ' ' })
        .expect(422),
    ),
  ).toEqual(['name']);
  await (await api.signedIn(people.viewer)).patch(one).send(naming).expect(403);
});
