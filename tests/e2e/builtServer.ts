import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { projectRoot } from '../../server/projectRoot.ts';

export type BuiltServer = { url: string; stop(): Promise<void> };

const PROGRAM = path.join('dist', 'server', 'index.js');
const CLIENT = path.join('dist', 'client', 'index.html');

/**
 * What `npm start` starts: the built server with the built client and the demo data, on a free port.
 *
 * @param databaseUrl throw-away; it is migrated and seeded
 * @throws Error when something is not built or the server does not start
 */
export async function startBuiltServer(databaseUrl: string): Promise<BuiltServer> {
  for (const file of [PROGRAM, CLIENT]) {
    if (!existsSync(path.join(projectRoot, file))) {
      throw new Error(`${file} is missing: these tests use what is built. "npm run build" makes it.`);
    }
  }
  const server = spawn(process.execPath, ['--enable-source-maps', PROGRAM], {
    cwd: projectRoot,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      // Answers are then held against their schemas.
      NODE_ENV: 'test',
      DATABASE_URL: databaseUrl,
      PORT: '0',
      LOG_LEVEL: 'error',
      ATTEMPT_LIMIT: '1000',
      THREADS: '2',
    },
  });
  let said = '';
  const lines = createInterface({ input: server.stdout });
  const keep = (text: unknown) => (said += `${String(text)}\n`);
  lines.on('line', keep);
  server.stderr.on('data', keep);
  const ended = once(server, 'exit');

  const url = await new Promise<string>((resolve, reject) => {
    lines.on('line', (line) => {
      const address = /^Skewlight is at (\S+)/.exec(line)?.[1];
      if (address) resolve(address);
    });
    void ended.then(() => reject(new Error(`The server did not start:\n${said}`)));
  });
  return {
    url,
    async stop() {
      server.kill('SIGTERM');
      await ended;
      if (server.exitCode !== 0) throw new Error(`The server did not stop in order:\n${said}`);
    },
  };
}
