import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type TestAgent from 'supertest/lib/agent.js';
import type { RunSummary, SweepAxis } from '../../../shared/run.ts';
import { decodeResult } from '../../../shared/resultFormat.ts';
import { solveRequestSchema } from '../../../shared/solve.ts';
import { solveRequest } from '../../../worker/optics/solveRequest.ts';
import { startApiServer } from '../../../tests/apiServer.ts';
import type { ApiServer } from '../../../tests/apiServer.ts';
import { buildPeople, buildSlowDocument } from '../../../tests/factories.ts';
import type { RunCalls, WantedRun } from '../../../tests/runCalls.ts';
import { runCalls } from '../../../tests/runCalls.ts';
import { waitForRun } from '../../../tests/waitForRun.ts';

const angles: SweepAxis = { kind: 'angle', from: 0, to: 80, points: 9, spacing: 'linear' };
const wavelengths: SweepAxis = { kind: 'wavelength', from: 400, to: 800, points: 5, spacing: 'linear' };
const scales: SweepAxis = { kind: 'voigtScale', from: 1, to: 2, points: 2, spacing: 'linear' };

let server: ApiServer;
let people: Awaited<ReturnType<typeof buildPeople>>;
let editor: TestAgent;
let start: RunCalls['start'];
let refused: RunCalls['refused'];
let dataOf: RunCalls['dataOf'];

beforeAll(async () => {
  server = await startApiServer();
  await server.dependencies.pool.warm();
  people = await buildPeople(server.models);
  editor = await server.signedIn(people.editor);
  ({ start, refused, dataOf } = runCalls(editor, people.group.id, angles));
});
afterAll(() => server.stop());

describe('a map with a family', () => {
  it('is stored with all axes and handed out as numbers, CSV and input in one order', async () => {
    const axes = { axis: angles, second: wavelengths, family: scales };
    const run = await start({ ...axes, readings: ['reflectanceP', 'crossSp'] });
    expect(run).toMatchObject({ ...axes, progress: { total: 90 } });
    await waitForRun(server.models, run.id, 'done');
    const data = await dataOf(run.id);
    expect(data.header).toMatchObject({ ...axes, pointCount: 90 });

    const input = await editor.get(`/api/v1/runs/${run.id}/input.json`).expect(200);
    const { results } = solveRequest(solveRequestSchema.parse(input.body));
    const points = results.flatMap((result) => result.points);
    expect(points).toHaveLength(90);
    points.forEach((point, index) => {
      expect(data.columns.reflectanceP![index]).toBeCloseTo(point.R.p, 11);
      expect(data.columns.crossSp![index]).toBeCloseTo(Math.hypot(...point.r!.sp), 11);
      expect(data.axis[index % 9]).toBe(point.angleDeg);
      expect(data.second![Math.floor(index / 9) % 5]).toBe(point.wavelengthNm);
    });

    const { text } = await editor.get(`/api/v1/runs/${run.id}/data.csv`).expect(200);
    const lines = text.trim().split('\r\n');
    expect(lines).toHaveLength(91);
    expect(lines[0]).toMatch(/^Angle of incidence \(deg\),Vacuum wavelength \(nm\),Scale of Q \(1\),/);
    expect(lines[1 + 9 * 6 + 2]!.split(',').slice(0, 3)).toEqual(['20', '500', '2']);

    const list = await editor.get(`/api/v1/groups/${people.group.id}/runs`).expect(200);
    const listed = (list.body as { runs: RunSummary[] }).runs.find(({ id }) => id === run.id);
    expect(listed).toMatchObject(axes);
    expect(run.assumptions.join('\n')).toMatch(/Second axis: wavelength.*\nFamily: scale of Q/);
  });

  it('is refused with the field of the axis that is wrong', async () => {
    const swept = { from: 0, to: 2, points: 3, spacing: 'linear' } as const;
    const paths = async (wanted: WantedRun) => (await refused(wanted)).map(({ path }) => path);
    expect(await paths({ second: { kind: 'thickness', layerId: 'nope', ...swept } })).toEqual([
      'second.layerId',
    ]);
    expect(await paths({ family: { kind: 'repeat', blockId: 'nope', ...swept } })).toEqual([
      'family.blockId',
    ]);
    expect(await paths({ axis: { kind: 'direction', plane: 'xz', layerId: 'cap', ...swept } })).toEqual([
      'axis.layerId',
    ]);
    expect(await paths({ second: angles })).toEqual(['second.kind']);
    // The film of 1 nm has no room for half of an interface of 3 nm.
    expect(await paths({ axis: { kind: 'graded', layerId: 'film', ...swept, to: 3 } })).toEqual(['axis.to']);
  });
});

describe('a map that is being computed', () => {
  it('shows what there is so far, and all of it once it is done', async () => {
    const run = await start({
      document: buildSlowDocument(),
      axis: { ...angles, points: 300 },
      second: { ...wavelengths, points: 300 },
      readings: ['reflectanceP'],
    });
    await editor.get(`/api/v1/runs/${run.id}/data`).expect(409);
    let partial = null;
    while (partial === null) {
      const response = await editor.get(`/api/v1/runs/${run.id}/data?partial=true`).responseType('blob');
      if (response.status === 200) partial = decodeResult(Uint8Array.from(response.body as Buffer).buffer);
      else expect(response.status).toBe(409);
      if (partial?.header.done === 0) partial = null;
    }
    const { done } = partial.header;
    const filled = partial.columns.reflectanceP!.filter((value) => !Number.isNaN(value)).length;
    expect(filled).toBeGreaterThanOrEqual(done!);
    expect(done).toBeLessThan(90_000);
    await waitForRun(server.models, run.id, 'done');
    const whole = await dataOf(run.id, '?partial=true');
    expect(whole.header.done).toBeUndefined();
    expect(whole.columns.reflectanceP!.every(Number.isFinite)).toBe(true);
    partial.columns.reflectanceP!.forEach((value, index) => {
      if (!Number.isNaN(value)) expect(value).toBe(whole.columns.reflectanceP![index]);
    });
  });
});
