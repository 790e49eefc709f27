import { afterAll, beforeAll, expect, test } from 'vitest';
import { z } from 'zod';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import { allRoutes } from '../allRoutes.ts';

let api: ApiServer;
beforeAll(async () => (api = await startApiServer()));
afterAll(() => api.stop());

const operationSchema = z.looseObject({
  summary: z.string().min(10),
  description: z.string(),
  responses: z.record(z.string(), z.unknown()),
});
const documentSchema = z.looseObject({
  openapi: z.literal('3.1.0'),
  paths: z.record(z.string(), z.record(z.string(), operationSchema)),
  components: z.looseObject({ schemas: z.record(z.string(), z.unknown()) }),
});

test('the description is OpenAPI 3.1 of every route, made from the schemas', async () => {
  const answer = await api.anonymous().get('/api/v1/openapi.json').expect(200);
  const { paths } = documentSchema.parse(answer.body);
  const described = Object.entries(paths).flatMap(([path, operations]) =>
    Object.keys(operations).map((method) => `${method} ${path}`),
  );
  const declared = allRoutes.map((route) => `${route.method} ${route.path.replace(/:(\w+)/g, '{$1}')}`);
  expect(described.sort()).toEqual(declared.sort());
  expect(JSON.stringify(paths['/solve']?.['post'])).toContain('wavelengthNm');
  expect(paths['/stacks/{stackId}']?.['patch']?.description).toContain('editor of the group');
});

test('every reference inside leads somewhere', async () => {
  const answer = await api.anonymous().get('/api/v1/openapi.json').expect(200);
  const { components } = documentSchema.parse(answer.body);
  const targets = [...answer.text.matchAll(/"\$ref":"#\/components\/schemas\/([^"]+)"/g)].map(
    (match) => match[1]!,
  );
  expect(targets.length).toBeGreaterThan(0);
  for (const target of new Set(targets)) expect(components.schemas).toHaveProperty(target);
});

test('the readable page loads nothing from elsewhere', async () => {
  const page = await api.anonymous().get('/api/v1/docs/').expect(200);
  expect(page.text).toContain('Skewlight API');
  const sources = [...page.text.matchAll(/(?:src|href)="([^"]+)"/g)].map((match) => match[1]!);
  expect(sources.length).toBeGreaterThan(2);
  for (const source of sources) {
    expect(source).toMatch(/^\.\//);
    await api.anonymous().get(`/api/v1/docs/${source}`).expect(200);
  }
  const start = await api.anonymous().get('/api/v1/docs/swagger-ui-init.js').expect(200);
  expect(start.text).toContain('/api/v1/openapi.json');
});
