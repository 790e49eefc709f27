import { migrate } from '../../server/migrations/migrate.ts';

/**
 * Runs once before the api and e2e projects of vitest: brings the throw-away database of this run to the newest
 * schema. `npm test` makes the database and drops it; without one there is nothing safe to migrate.
 */
export default async function prepareDatabase(): Promise<void> {
  const databaseUrl = process.env['TEST_DATABASE_URL'];
  if (!databaseUrl) {
    throw new Error(
      'TEST_DATABASE_URL is not set: these tests need a throw-away PostgreSQL database. ' +
        'Run them through "npm test -- api" or "npm test -- e2e", which makes one and drops it.',
    );
  }
  await migrate(databaseUrl);
}
