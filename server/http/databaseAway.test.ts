import { createServer, connect } from 'node:net';
import type { AddressInfo, Server, Socket } from 'node:net';
import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { healthSchema } from '../../shared/health.ts';
import { read, refusalOf } from '../../tests/answers.ts';
import type { ApiServer } from '../../tests/apiServer.ts';
import { startApiServer } from '../../tests/apiServer.ts';
import { buildPeople } from '../../tests/factories.ts';

/** A cable to the database that can be pulled: the server under test connects through it. */
class Cable {
  readonly #target: URL;
  readonly #sockets = new Set<Socket>();
  #server: Server | null = null;
  #port = 0;

  constructor(target: string) {
    this.#target = new URL(target);
  }

  get url(): string {
    const url = new URL(this.#target);
    url.port = String(this.#port);
    return url.toString();
  }

  async plugIn(): Promise<void> {
    const server = createServer((near) => {
      const far = connect(Number(this.#target.port), this.#target.hostname);
      for (const socket of [near, far]) {
        this.#sockets.add(socket);
        socket.on('error', () => {}).on('close', () => this.#sockets.delete(socket));
      }
      near.pipe(far).pipe(near);
    });
    await new Promise<void>((resolve) => server.listen(this.#port, '127.0.0.1', resolve));
    this.#port = (server.address() as AddressInfo).port;
    this.#server = server;
  }

  async pull(): Promise<void> {
    const closed = new Promise((resolve) => this.#server?.close(resolve));
    for (const socket of this.#sockets) socket.destroy();
    await closed;
  }
}

const cable = new Cable(process.env['TEST_DATABASE_URL'] ?? '');
let api: ApiServer;
beforeAll(async () => {
  await cable.plugIn();
  api = await startApiServer({ databaseUrl: cable.url });
});
afterAll(async () => {
  await api.stop();
  await cable.pull();
});

test('the server outlives its database: 503 meanwhile, and back without a restart', async () => {
  const { viewer, group } = await buildPeople(api.models);
  const browser = await api.signedIn(viewer);
  const list = () => browser.get(`/api/v1/groups/${group.id}/stacks`);
  await list().expect(200);
  await cable.pull();
  const refused = await list().expect(503);
  expect(refusalOf(refused)).toMatchObject({ code: 'unavailable', requestId: refused.get('X-Request-Id') });
  expect(refusalOf(refused).message).toContain('Nothing was changed');
  const health = await api.anonymous().get('/api/v1/health').expect(503);
  expect(read(healthSchema, health)).toMatchObject({
    ok: false,
    database: { ok: false },
    pool: { ok: true },
  });
  const signIn = { email: viewer.email, password: 'whatever it is' };
  await api.anonymous().post('/api/v1/session').send(signIn).expect(503);
  await cable.plugIn();
  await vi.waitFor(() => list().expect(200), { timeout: 15_000, interval: 200 });
  await vi.waitFor(() => api.anonymous().get('/api/v1/health').expect(200), {
    timeout: 15_000,
    interval: 200,
  });
});
