import { afterAll, beforeAll, expect, test } from 'vitest';
import { materialListSchema, materialSchema } from '../../../shared/material.ts';
import { issuePaths, read } from '../../../tests/answers.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { buildContent, buildMaterial, buildPeople } from '../../../tests/factories.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

test("a group sees the shipped library and its own materials, and nobody else's", async () => {
  const { viewer, group, strangersGroup } = await buildPeople(api.models);
  const shipped = await buildMaterial(api.models);
  const own = await buildMaterial(api.models, { group });
  const foreign = await buildMaterial(api.models, { group: strangersGroup });
  const browser = await api.signedIn(viewer);
  const answer = await browser.get(`/api/v1/groups/${group.id}/materials`).expect(200);
  const ids = read(materialListSchema, answer).materials.map((material) => material.id);
  expect(ids).toContain(shipped.id);
  expect(ids).toContain(own.id);
  expect(ids).not.toContain(foreign.id);
  await browser.get(`/api/v1/materials/${own.id}`).expect(200);
  await browser.get(`/api/v1/materials/${foreign.id}`).expect(404);
  await browser.get(`/api/v1/groups/${strangersGroup.id}/materials`).expect(404);
  await api.anonymous().get(`/api/v1/groups/${group.id}/materials`).expect(401);
  await api.anonymous().get(`/api/v1/materials/${shipped.id}`).expect(401);
});

test('a material says where it is known, with curves inside that range', async () => {
  const { viewer } = await buildPeople(api.models);
  const { id } = await buildMaterial(api.models);
  const browser = await api.signedIn(viewer);
  const material = read(materialSchema, await browser.get(`/api/v1/materials/${id}`).expect(200));
  expect(material).toMatchObject({ id, version: 1, rangeNm: [400, 800], voigtRangeNm: [400, 800] });
  const { wavelengthsNm, n } = material.curves;
  expect([wavelengthsNm[0], wavelengthsNm.at(-1)]).toEqual([400, 800]);
  expect(n).toHaveLength(wavelengthsNm.length);
});

test('an old version stays readable as it was', async () => {
  const { viewer } = await buildPeople(api.models);
  const known: [number, number] = [300, 900];
  const newer = buildContent({
    index: { kind: 'formula', expression: 'c1', coefficients: [1.5], rangeNm: known },
    voigt: null,
    voigtSource: null,
  });
  const { id } = await buildMaterial(api.models, { contents: [buildContent(), newer] });
  const browser = await api.signedIn(viewer);
  const get = async (query: string) =>
    read(materialSchema, await browser.get(`/api/v1/materials/${id}${query}`).expect(200));
  expect(await get('')).toMatchObject({ version: 2, rangeNm: known, voigtRangeNm: null });
  expect(await get('?version=1')).toMatchObject({ version: 1, rangeNm: [400, 800] });
  await browser.get(`/api/v1/materials/${id}?version=3`).expect(404);
  for (const bad of ['0', '-1', '1.5', 'x', '99999999999', '']) {
    const refused = await browser.get(`/api/v1/materials/${id}?version=${bad}`).expect(422);
    expect(issuePaths(refused)).toEqual(['version']);
  }
  expect(issuePaths(await browser.get(`/api/v1/materials/${id}?versoin=1`).expect(422))).toEqual(['versoin']);
});

test.each(['no-such', '%00', "'%3B--", '..%2f..'])("the id %s is nobody's", async (id) => {
  const { viewer } = await buildPeople(api.models);
  const browser = await api.signedIn(viewer);
  await browser.get(`/api/v1/materials/${id}`).expect(404);
});
