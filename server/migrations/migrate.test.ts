import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { buildContent, buildMaterial } from '../../tests/factories.ts';
import type { ScratchDatabase } from '../../tests/scratchDatabase.ts';
import { createScratchDatabase } from '../../tests/scratchDatabase.ts';
import { createModels } from '../models/models.ts';
import type { Models } from '../models/models.ts';
import { migrate, migrateDown } from './migrate.ts';

let scratch: ScratchDatabase;
let models: Models;
beforeAll(async () => {
  scratch = await createScratchDatabase();
  models = createModels(scratch.url);
});
afterAll(async () => {
  await models.sequelize.close();
  await scratch.drop();
});

const tables = async () => {
  const rows = await models.sequelize.query<{ name: string }>(
    `SELECT table_name AS name FROM information_schema.tables WHERE table_schema = 'public' ORDER BY 1`,
    { type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.name);
};

test('servers that start together take every step once; all steps have a way down, and up again', async () => {
  const [first, second] = await Promise.all([migrate(scratch.url), migrate(scratch.url)]);
  expect([first.length, second.length].sort()).toEqual([0, Math.max(first.length, second.length)]);
  const made = await tables();
  const taken = first.length > 0 ? first : second;
  expect(made).toEqual(
    expect.arrayContaining(['users', 'stacks', 'materials', 'runs', 'share_links', 'activity']),
  );
  expect(await migrateDown(scratch.url)).toEqual([...taken].reverse());
  expect(await tables()).toEqual(['schema_migrations']);
  expect(await migrate(scratch.url)).toEqual(taken);
  expect(await tables()).toEqual(made);
  expect(await migrate(scratch.url)).toEqual([]);
});

test('every model fits its table', async () => {
  await migrate(scratch.url);
  for (const model of Object.values(models.sequelize.models)) {
    expect(await model.findAll()).toEqual([]);
    const columns = Object.keys(
      await models.sequelize.getQueryInterface().describeTable(model.getTableName()),
    );
    const fields = Object.values(model.getAttributes()).map((attribute) => attribute.field);
    expect(columns.sort()).toEqual(fields.sort());
  }
});

test('the database itself keeps a version of a material as it is', async () => {
  await migrate(scratch.url);
  const material = await buildMaterial(models, { id: 'kept' });
  const change = models.MaterialVersion.update(
    { content: buildContent({ voigt: null, voigtSource: null }) },
    { where: { materialId: 'kept' } },
  );
  await expect(change).rejects.toThrow(/never changed/);
  await material.destroy();
});
