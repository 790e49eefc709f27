import type TestAgent from 'supertest/lib/agent.js';
import type { Issue } from '../shared/error.ts';
import { decodeResult } from '../shared/resultFormat.ts';
import type { CreateRun, Run, SweepAxis } from '../shared/run.ts';
import { buildDocument } from './factories.ts';

export type WantedRun = Partial<Omit<CreateRun, 'groupId'>>;

export type RunCalls = ReturnType<typeof runCalls>;

/** The calls that tests of runs make as one person: start one, be refused one, fetch its numbers. */
export function runCalls(person: TestAgent, groupId: string, axis: SweepAxis) {
  const requestOf = (wanted: WantedRun = {}): CreateRun => ({
    groupId,
    document: buildDocument(),
    axis,
    ...wanted,
  });
  return {
    requestOf,
    async start(this: void, wanted: WantedRun = {}): Promise<Run> {
      const { body } = (await person.post('/api/v1/runs').send(requestOf(wanted)).expect(201)) as {
        body: Run;
      };
      return body;
    },
    async refused(this: void, wanted: WantedRun): Promise<Issue[]> {
      const { body } = (await person.post('/api/v1/runs').send(requestOf(wanted)).expect(422)) as {
        body: { error: { issues: Issue[] } };
      };
      return body.error.issues;
    },
    async dataOf(this: void, runId: string, query = '') {
      const { body } = (await person
        .get(`/api/v1/runs/${runId}/data${query}`)
        .buffer(true)
        .responseType('blob')
        .expect(200)) as { body: Buffer };
      return decodeResult(Uint8Array.from(body).buffer);
    },
  };
}
