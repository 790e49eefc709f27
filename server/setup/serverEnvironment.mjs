import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { useLocalCluster } from './postgres/localCluster.mjs';
import { inProject } from './projectPaths.mjs';

const secretFile = inProject('data', 'pg', 'session-secret');

/** Generated once and kept, so that a restart does not sign everybody out. */
function localSessionSecret() {
  if (!fs.existsSync(secretFile)) {
    fs.mkdirSync(path.dirname(secretFile), { recursive: true, mode: 0o700 });
    const own = `${secretFile}.${process.pid}`;
    fs.writeFileSync(own, `${randomBytes(32).toString('hex')}\n`, { mode: 0o600 });
    // Complete before it gets its name, and only if it is the first: two starts at once end up with one secret.
    try {
      fs.linkSync(own, secretFile);
    } catch (error) {
      if (error.code !== 'EEXIST') throw error;
    }
    fs.rmSync(own);
  }
  return fs.readFileSync(secretFile, 'utf8').trim();
}

/** Host and port of the server, as the environment says or by default. */
export const serverAddress = () => ({
  host: process.env.HOST || '127.0.0.1',
  port: process.env.PORT || '4310',
});

/**
 * The environment of the server: everything that is set passes through, the rest gets the defaults of a local
 * demo. DATABASE_URL, when set, is used as it is and no cluster is touched.
 * @returns {Promise<NodeJS.ProcessEnv>}
 */
export async function serverEnvironment() {
  const { host, port } = serverAddress();
  const mode = process.env.NODE_ENV || 'development';
  const databaseUrl = process.env.DATABASE_URL || (await useLocalCluster()).databaseUrl;
  const environment = { ...process.env, DATABASE_URL: databaseUrl, HOST: host, PORT: port, NODE_ENV: mode };
  // In production a missing secret is a mistake, and the server refuses to start without one.
  if (!environment.SESSION_SECRET && mode !== 'production') environment.SESSION_SECRET = localSessionSecret();
  return environment;
}
