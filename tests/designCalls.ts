import type TestAgent from 'supertest/lib/agent.js';
import { designResultSchema, designSchema } from '../shared/design.ts';
import type { Design, DesignInput, DesignResult } from '../shared/design.ts';
import type { PointReadings } from '../shared/designPoint.ts';
import { readingOf } from '../shared/readings.ts';
import { solveRequestSchema } from '../shared/solve.ts';
import { solveRequest } from '../worker/optics/solveRequest.ts';
import type { Models } from '../server/models/models.ts';
import { read } from './answers.ts';
import { waitForRun } from './waitForRun.ts';

/** The calls that tests of designs make as one person. */
export function designCalls(person: TestAgent, models: Models, groupId: string) {
  const start = async (input: DesignInput): Promise<Design> =>
    read(designSchema, await person.post('/api/v1/designs').send({ groupId, input }).expect(201));
  return {
    start,
    async finished(this: void, input: DesignInput): Promise<Design> {
      const { id } = await start(input);
      await waitForRun(models, id, 'done');
      return read(designSchema, await person.get(`/api/v1/designs/${id}`).expect(200));
    },
    async resultOf(this: void, designId: string): Promise<DesignResult> {
      return read(designResultSchema, await person.get(`/api/v1/designs/${designId}/result`).expect(200));
    },
    /** Readings for p light of the films of input.json, solved as the command line solves them. */
    async reproduced(this: void, designId: string): Promise<PointReadings[]> {
      const { text } = await person.get(`/api/v1/designs/${designId}/input.json`).buffer(true).expect(200);
      const { results } = solveRequest(solveRequestSchema.parse(JSON.parse(text)));
      const points = results.map((result) => result.points[0]!);
      return Array.from({ length: points.length / 3 }, (_, film) => {
        const [given, zero, reversed] = points.slice(3 * film);
        const value = (name: Parameters<typeof readingOf>[0]) => readingOf(name, given!, zero!, reversed!);
        return {
          rotationDeg: value('rotationP'),
          ellipticityDeg: value('ellipticityP'),
          amplitude: value('crossSp'),
          contrast: value('contrastP'),
          reflectance: value('reflectanceP') ?? NaN,
          ceilingShare: value('ceilingShare'),
        };
      });
    },
  };
}
