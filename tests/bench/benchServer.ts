import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { projectRoot } from '../../server/projectRoot.ts';

export type BenchServer = {
  url: string;
  /** Most memory that the process has held since its start, MB. */
  peakMemoryMb(): number;
  stop(): Promise<void>;
};

const PROGRAM = path.join('dist', 'server', 'index.js');

/**
 * What `npm start` starts, on a free port, as it runs for people: without the checks that tests add.
 *
 * @param databaseUrl throw-away; it is migrated and seeded
 * @throws Error when the server is not built or does not start
 */
export async function startBenchServer(databaseUrl: string): Promise<BenchServer> {
  if (!existsSync(path.join(projectRoot, PROGRAM))) {
    throw new Error(`${PROGRAM} is missing: "npm run build" makes it.`);
  }
  const server = spawn(process.execPath, [PROGRAM], {
    cwd: projectRoot,
    stdio: ['ignore', 'pipe', 'inherit'],
    env: {
      ...process.env,
      NODE_ENV: 'development',
      DATABASE_URL: databaseUrl,
      PORT: '0',
      LOG_LEVEL: 'error',
      ATTEMPT_LIMIT: '1000',
    },
  });
  const ended = once(server, 'exit');
  const lines = createInterface({ input: server.stdout });
  const url = await new Promise<string>((resolve, reject) => {
    lines.on('line', (line) => {
      const address = /^Skewlight is at (\S+)/.exec(line)?.[1];
      if (address) resolve(address);
    });
    void ended.then(() => reject(new Error('The server did not start.')));
  });
  return {
    url,
    peakMemoryMb() {
      const status = readFileSync(`/proc/${server.pid}/status`, 'utf8');
      return Number(/^VmHWM:\s+(\d+) kB/m.exec(status)?.[1] ?? NaN) / 1_000;
    },
    async stop() {
      server.kill('SIGTERM');
      await ended;
    },
  };
}
