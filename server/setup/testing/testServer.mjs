import { providePostgresBinaries } from '../postgres/binaries.mjs';
import { useLocalCluster } from '../postgres/localCluster.mjs';

/**
 * The PostgreSQL for the tests: the server of DATABASE_URL when set (its role must be allowed to create
 * databases; the database it names is not touched), else the project's own.
 * @returns {Promise<{ adminUrl: string, binaries: string }>}
 */
export async function testServer() {
  const given = process.env.DATABASE_URL;
  if (!given) return useLocalCluster();
  return { adminUrl: given, binaries: await providePostgresBinaries() };
}
