import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { errorEnvelopeSchema } from '../shared/error.ts';
import { solveResponseSchema } from '../shared/solve.ts';

// The command line as people run it: a process of its own, files and standard input, exit status.

const root = fileURLToPath(new URL('..', import.meta.url));
const tsx = path.join(root, 'node_modules', 'tsx', 'dist', 'cli.mjs');

type Outcome = { status: number; output: string; complaint: string };

function run(args: string[], input?: string): Promise<Outcome> {
  return new Promise((resolve) => {
    const child = execFile(
      process.execPath,
      [tsx, 'worker/solve.ts', ...args],
      { cwd: root, maxBuffer: 64_000_000 },
      (error, output, complaint) => {
        const status = error === null ? 0 : typeof error.code === 'number' ? error.code : -1;
        resolve({ status, output, complaint });
      },
    );
    child.stdin?.end(input ?? '');
  });
}

let folder = '';
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'skewlight-solve-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

async function fileOf(content: string): Promise<string> {
  const file = path.join(folder, `${crypto.randomUUID()}.json`);
  await writeFile(file, content);
  return file;
}

/** The example of the contract, with the numbers printed beside it. */
const example = {
  wavelengthNm: 632.8,
  angleDeg: 60,
  incident: { index: 1.0 },
  layers: [
    { thicknessNm: 2, index: [0.12, 3.29] },
    { thicknessNm: 10, index: [2.87, 3.36], voigt: [0.0376, 0.0066], m: [0, 0, 1] },
    {
      repeat: 20,
      layers: [
        { thicknessNm: 0.4, index: [2.3, 4.1], voigt: [0.03, 0.01], m: [0, 0, 1] },
        { thicknessNm: 1, index: [2.3, 4.2] },
      ],
    },
  ],
  substrate: { index: [3.88, 0.02] },
};

/** A printed number of four decimals. */
const about = (value: number) => expect.closeTo(value, 4) as number;

const answerOf = ({ output }: Outcome) => solveResponseSchema.parse(JSON.parse(output));

describe('an accepted file', () => {
  test('the contract’s example prints the numbers printed there', async () => {
    const outcome = await run([await fileOf(JSON.stringify({ cases: [example] }))]);
    expect([outcome.status, outcome.complaint]).toEqual([0, '']);
    const answer = answerOf(outcome);
    expect(answer.results).toHaveLength(1);
    expect(answer.warnings).toBeUndefined();
    const point = answer.results[0]?.points[0];
    expect(point).toMatchObject({
      wavelengthNm: 632.8,
      angleDeg: 60,
      R: { p: about(0.4395), s: about(0.8043) },
      T: { p: about(0.061), s: about(0.0224) },
      A: { p: about(0.4995), s: about(0.1733) },
      kerr: {
        p: { rotationDeg: about(0.2883), ellipticityDeg: about(-0.0266) },
        s: { rotationDeg: about(0.1884), ellipticityDeg: about(0.1016) },
      },
    });
  });

  test('from standard input for -, with a byte order mark', async () => {
    const outcome = await run(['-'], `\uFEFF${JSON.stringify({ cases: [example] })}`);
    expect(outcome.status).toBe(0);
    expect(answerOf(outcome).results[0]?.points).toHaveLength(1);
  });

  test('stands for every pair of wavelength and angle, wavelength outermost, in order', async () => {
    const swept = { ...example, wavelengthNm: [500, 600], angleDeg: [0, 30, 60] };
    const outcome = await run(['-'], JSON.stringify({ cases: [swept, example] }));
    const [first, second] = answerOf(outcome).results;
    expect(first?.points.map((point) => [point.wavelengthNm, point.angleDeg])).toEqual(
      [500, 600].flatMap((wavelength) => [0, 30, 60].map((angle) => [wavelength, angle])),
    );
    expect(second?.points).toHaveLength(1);
  });

  test('takes one sample per wavelength, of the incident medium too', async () => {
    const sampled = {
      wavelengthNm: [500, 600],
      angleDeg: 40,
      incident: { index: { samples: [1, 1.5] } },
      layers: [],
      substrate: { index: { samples: [1.5, [2, 1]] } },
    };
    const alone = (index: number, substrate: unknown, wavelengthNm: number) => ({
      ...sampled,
      wavelengthNm,
      incident: { index },
      substrate: { index: substrate },
    });
    const cases = [sampled, alone(1, 1.5, 500), alone(1.5, [2, 1], 600)];
    const [both, first, second] = answerOf(await run(['-'], JSON.stringify({ cases }))).results;
    expect(both?.points).toEqual([...(first?.points ?? []), ...(second?.points ?? [])]);
    expect(both?.points).toHaveLength(2);
  });

  test('the 208 reference cases, all solved in one call', async () => {
    const reference = z
      .object({ cases: z.array(z.object({ case: z.unknown() })) })
      .parse(JSON.parse(await readFile(path.join(root, 'tests/reference/solver-cases.json'), 'utf8')));
    const input = { cases: reference.cases.map((one) => one.case) };
    const outcome = await run([await fileOf(JSON.stringify(input))]);
    expect(outcome.status).toBe(0);
    const { results } = answerOf(outcome);
    expect(results).toHaveLength(208);
    expect(results.every((result) => result.points.length === 1)).toBe(true);
  });

  test('more points than one write holds come out whole', async () => {
    const angleDeg = Array.from({ length: 1234 }, (_, i) => i / 20);
    const outcome = await run(['-'], JSON.stringify({ cases: [{ ...example, angleDeg }] }));
    expect(answerOf(outcome).results[0]?.points.map((point) => point.angleDeg)).toEqual(angleDeg);
  });
});

describe('warnings stand beside the results', () => {
  test('a medium that is not passive, at the first wavelength where it is not', async () => {
    const gain = { index: [2, 0.1], voigt: { samples: [0.01, [0, 0.9]] }, m: [0, 0, 1], thicknessNm: 5 };
    const cases = [
      example,
      { ...example, wavelengthNm: [500, 600], layers: [{ repeat: 2, layers: [gain] }] },
    ];
    const { warnings, results } = answerOf(await run(['-'], JSON.stringify({ cases })));
    expect(results).toHaveLength(2);
    expect(warnings).toEqual([
      {
        case: 1,
        path: 'cases[1].layers[0].layers[0]',
        message: expect.stringMatching(/^is not passive at 600 nm/) as string,
      },
    ]);
  });

  test('voigt without m', async () => {
    const substrate = { index: [2.87, 3.36], voigt: [0.0376, 0.0066] };
    const { warnings } = answerOf(await run(['-'], JSON.stringify({ cases: [{ ...example, substrate }] })));
    expect(warnings).toEqual([
      {
        case: 0,
        path: 'cases[0].substrate.voigt',
        message: expect.stringMatching(/^has no effect without m/) as string,
      },
    ]);
  });
});

describe('what cannot be read', () => {
  test.each<[string, () => Promise<string[]>, RegExp]>([
    ['no argument', () => Promise.resolve([]), /name a file of cases/],
    ['a missing file', () => Promise.resolve(['/nowhere/cases.json']), /cannot read \/nowhere\/cases\.json/],
    ['a folder', () => Promise.resolve(['/']), /cannot read \//],
    ['broken JSON', async () => [await fileOf('{"cases": [')], /is not JSON/],
    ['an empty file', async () => [await fileOf('')], /is not JSON/],
  ])('%s is refused in the same envelope', async (_name, args, message) => {
    const outcome = await run(await args());
    expect(outcome.status).toBe(1);
    expect(errorEnvelopeSchema.parse(JSON.parse(outcome.output)).error).toMatchObject({
      code: 'invalid',
      message: expect.stringMatching(message) as string,
    });
  });

  test('a million and one points are refused, a case beside them not solved', async () => {
    const angleDeg = Array.from({ length: 1_000_001 }, (_, i) => i / 20_000);
    const outcome = await run([await fileOf(JSON.stringify({ cases: [{ ...example, angleDeg }] }))]);
    expect(outcome.status).toBe(1);
    const { error } = errorEnvelopeSchema.parse(JSON.parse(outcome.output));
    expect(error.issues?.[0]?.path).toBe('cases');
    expect(error.message).toMatch(/at most 1000000 points.*got 1000001/);
  });

  test('one bad case refuses the whole file with every issue, and nothing is solved', async () => {
    const bad = {
      ...example,
      angleDeg: 90,
      layers: [{ thicknessNm: -2, index: [1, -1] }, ...example.layers],
    };
    const outcome = await run(['-'], JSON.stringify({ cases: [example, example, example, bad] }));
    expect(outcome.status).toBe(1);
    expect(outcome.output).not.toContain('results');
    const { error } = errorEnvelopeSchema.parse(JSON.parse(outcome.output));
    expect(error.issues?.map((issue) => issue.path)).toEqual([
      'cases[3].angleDeg',
      'cases[3].layers[0].thicknessNm',
      'cases[3].layers[0].index',
    ]);
    expect(error.message).toContain('cases[3].layers[0].thicknessNm: must be >= 0, got -2');
  });
});
