import { randomUUID } from 'node:crypto';
import { Sequelize } from 'sequelize';

export type ScratchDatabase = { url: string; drop(): Promise<void> };

/** An empty database beside the test database, for tests that need one to themselves. Drop it when done. */
export async function createScratchDatabase(): Promise<ScratchDatabase> {
  const testUrl = process.env['TEST_DATABASE_URL'] ?? '';
  const name = `skewlight_scratch_${randomUUID().slice(0, 8)}`;
  await administer(testUrl, `CREATE DATABASE ${name}`);
  const url = new URL(testUrl);
  url.pathname = `/${name}`;
  return {
    url: url.toString(),
    drop: () => administer(testUrl, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`),
  };
}

async function administer(databaseUrl: string, statement: string): Promise<void> {
  const sequelize = new Sequelize(databaseUrl, { logging: false });
  try {
    await sequelize.query(statement);
  } finally {
    await sequelize.close();
  }
}
