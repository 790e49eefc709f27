import { setTimeout as sleep } from 'node:timers/promises';
import { sessionSchema } from '../../shared/account.ts';
import type { LiveCurveRequest } from '../../shared/live.ts';
import { decodeResult } from '../../shared/resultFormat.ts';
import type { RunResult } from '../../shared/resultFormat.ts';
import { runSchema } from '../../shared/run.ts';
import type { CreateRun, Run } from '../../shared/run.ts';
import type { LibrarySolveRequest } from '../../shared/solve.ts';
import { DEMO_PASSWORD } from '../../server/seeders/demoData.ts';

const POLL_MS = 10;
/** Nothing that is measured here may take longer. */
const TIMEOUT_MS = 120_000;

/** A person at a browser: one session, requests over HTTP. */
export class User {
  readonly #api: string;
  readonly #cookie: string;
  readonly groupId: string;

  private constructor(api: string, cookie: string, groupId: string) {
    this.#api = api;
    this.#cookie = cookie;
    this.groupId = groupId;
  }

  /** @param email of a demo account */
  static async signIn(url: string, email: string): Promise<User> {
    const api = `${url}/api/v1`;
    const response = await fetch(`${api}/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({ email, password: DEMO_PASSWORD }),
    });
    if (!response.ok) throw new Error(`Signing in as ${email}: ${response.status} ${await response.text()}`);
    const cookie = response.headers
      .getSetCookie()
      .map((one) => one.split(';')[0])
      .join('; ');
    const { groups } = sessionSchema.parse(await response.json());
    return new User(api, cookie, (groups.find(({ isDemo }) => isDemo) ?? groups[0]!).groupId);
  }

  /** Answers of the solve contract are read but not looked at: the client's parsing is no part of the latency. */
  async solve(request: LibrarySolveRequest): Promise<void> {
    await (await this.#send('POST', '/solve', request)).text();
  }

  async liveCurve(request: LiveCurveRequest): Promise<RunResult> {
    return decodeResult(await (await this.#send('POST', '/live-curve', request)).arrayBuffer());
  }

  async startRun(wanted: Omit<CreateRun, 'groupId'>): Promise<Run> {
    const response = await this.#send('POST', '/runs', { ...wanted, groupId: this.groupId });
    return runSchema.parse(await response.json());
  }

  /** Waits until the numbers are stored. */
  async finished(runId: string): Promise<Run> {
    for (const started = performance.now(); performance.now() - started < TIMEOUT_MS; await sleep(POLL_MS)) {
      const run = runSchema.parse(await (await this.#send('GET', `/runs/${runId}`)).json());
      if (run.progress.state === 'done') return run;
      if (run.progress.error !== null) throw new Error(run.progress.error);
    }
    throw new Error(`The run ${runId} is not done after ${TIMEOUT_MS / 1_000} s.`);
  }

  /** What there is of a reading as soon as anything is computed. */
  async firstPicture(runId: string, reading: string): Promise<RunResult> {
    const path = `${this.#api}/runs/${runId}/data?partial=true&readings=${reading}`;
    for (const started = performance.now(); performance.now() - started < TIMEOUT_MS; await sleep(POLL_MS)) {
      const response = await fetch(path, { headers: { Cookie: this.#cookie } });
      const bytes = await response.arrayBuffer();
      if (!response.ok) continue;
      const result = decodeResult(bytes);
      if (result.header.done !== 0) return result;
    }
    throw new Error(`The run ${runId} shows nothing after ${TIMEOUT_MS / 1_000} s.`);
  }

  async data(runId: string, reading: string): Promise<RunResult> {
    const response = await this.#send('GET', `/runs/${runId}/data?readings=${reading}`);
    return decodeResult(await response.arrayBuffer());
  }

  async removeRun(runId: string): Promise<void> {
    await this.#send('DELETE', `/runs/${runId}`);
  }

  async #send(method: string, path: string, body?: unknown): Promise<Response> {
    const response = await fetch(`${this.#api}${path}`, {
      method,
      headers: {
        Cookie: this.#cookie,
        ...(body === undefined ? {} : { 'Content-Type': 'application/json' }),
      },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    if (!response.ok) throw new Error(`${method} ${path}: ${response.status} ${await response.text()}`);
    return response;
  }
}
