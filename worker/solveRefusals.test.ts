import { execFile } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import path from 'node:path';
import { beforeAll, describe, expect, test } from 'vitest';
import type { Issue } from '../shared/error.ts';
import { errorEnvelopeSchema } from '../shared/error.ts';

// Every line of the contract's list "Refused", on the command line: status 1, the path of the field, a remedy, and
// nothing solved. The lines of one table go in as the cases of one file, so that each must be named by its own path.

const root = fileURLToPath(new URL('..', import.meta.url));
const tsx = path.join(root, 'node_modules', 'tsx', 'dist', 'cli.mjs');

function solve(input: string): Promise<{ status: number; output: string }> {
  return new Promise((resolve) => {
    const child = execFile(
      process.execPath,
      [tsx, 'worker/solve.ts', '-'],
      { cwd: root, maxBuffer: 16_000_000 },
      (error, output) => {
        resolve({ status: typeof error?.code === 'number' ? error.code : 0, output });
      },
    );
    child.stdin?.end(input);
  });
}

type Line = [what: string, change: object, path: string, message: RegExp];

const base = {
  wavelengthNm: 500,
  angleDeg: 0,
  incident: { index: 1 },
  layers: [] as unknown[],
  substrate: { index: 1.5 },
};
const film = { thicknessNm: 5, index: [2, 1] };
const withFilm = (change: object) => ({ layers: [{ ...film, ...change }] });
const identity = [
  [2, 0, 0],
  [0, 2, 0],
  [0, 0, 2],
];
const nested = (depth: number): unknown[] =>
  depth === 0 ? [film] : [{ repeat: 1, layers: nested(depth - 1) }];
const quadratic = { g11: 0.1, g12: 0.1, g44: 0.1 };

/** What a look at each field by itself finds. */
const FIELDS: Line[] = [
  // 1e999 in a file reads as Infinity: JSON has no other way to say it.
  ['a wavelength that is not finite', { wavelengthNm: 'INF' }, 'wavelengthNm', /got Infinity/],
  [
    'an index that is not finite',
    withFilm({ index: ['INF', 0] }),
    'layers[0].index[0]',
    /finite number, got Infinity/,
  ],
  ['wavelengthNm 0', { wavelengthNm: 0 }, 'wavelengthNm', /must be > 0, got 0/],
  ['wavelengthNm < 0 in a list', { wavelengthNm: [500, -1] }, 'wavelengthNm[1]', /must be > 0, got -1/],
  ['an empty list of wavelengths', { wavelengthNm: [] }, 'wavelengthNm', /at least 1 entry, got 0/],
  ['angleDeg 90', { angleDeg: 90 }, 'angleDeg', /must be < 90, got 90/],
  ['angleDeg < 0 in a list', { angleDeg: [0, -0.1] }, 'angleDeg[1]', /must be >= 0, got -0.1/],
  ['negative thickness', withFilm({ thicknessNm: -2 }), 'layers[0].thicknessNm', /must be >= 0, got -2/],
  ['no thickness', { layers: [{ index: 2 }] }, 'layers[0].thicknessNm', /is required/],
  ['k < 0', withFilm({ index: [2, -1] }), 'layers[0].index', /k must be >= 0, got -1.*N = n \+ ik/],
  ['k < 0 in samples', withFilm({ index: { samples: [[2, -1]] } }), 'layers[0].index.samples[0]', /n \+ ik/],
  ['n < 0', { substrate: { index: -1.5 } }, 'substrate.index', /n must be >= 0, got -1.5/],
  ['N = 0', { substrate: { index: [0, 0] } }, 'substrate.index', /must not be 0/],
  [
    'eps_zz = 0',
    {
      layers: [
        {
          thicknessNm: 1,
          epsilon: [
            [2, 0, 0],
            [0, 2, 0],
            [0, 0, [0, 0]],
          ],
        },
      ],
    },
    'layers[0].epsilon[2][2]',
    /eps_zz must not be 0/,
  ],
  [
    'quadratic beside extraordinary',
    withFilm({ extraordinary: 2, axis: [0, 0, 1], quadratic }),
    'layers[0].quadratic',
    /beside extraordinary/,
  ],
  ['|m| > 1', withFilm({ voigt: 0.1, m: [0, 0, 1.001] }), 'layers[0].m', /\|m\| must be <= 1.*got 1.001/],
  ['epsilon beside index', withFilm({ epsilon: identity }), 'layers[0].index', /beside epsilon/],
  [
    'epsilon beside m',
    { substrate: { epsilon: identity, m: [0, 0, 1] } },
    'substrate.m',
    /cannot stand beside epsilon/,
  ],
  ['repeat 1.5', { layers: [{ repeat: 1.5, layers: [] }] }, 'layers[0].repeat', /whole number, got 1.5/],
  ['repeat -1', { layers: [{ repeat: -1, layers: [] }] }, 'layers[0].repeat', /must be >= 0, got -1/],
  [
    'repeat 1001',
    { layers: [{ repeat: 1001, layers: [] }] },
    'layers[0].repeat',
    /must be <= 1000, got 1001/,
  ],
  [
    'a zero axis',
    withFilm({ extraordinary: 2, axis: [0, 0, 0] }),
    'layers[0].axis',
    /must not be the zero vector/,
  ],
  ['extraordinary without axis', withFilm({ extraordinary: 2 }), 'layers[0].axis', /is required/],
  ['a medium without constants', { substrate: {} }, 'substrate.index', /is required/],
  ['a number of the wrong shape', withFilm({ index: [1, 2, 3] }), 'layers[0].index', /number or \[re, im\]/],
  ['m of two numbers', withFilm({ m: [0, 1] }), 'layers[0].m', /three numbers|entr/],
  [
    'a tensor of two rows',
    { substrate: { epsilon: identity.slice(1) } },
    'substrate.epsilon',
    /3 entries, got 2/,
  ],
  ['a layer that is a number', { layers: [7] }, 'layers[0]', /a layer or a block/],
  ['layers that are no list', { layers: film }, 'layers', /array/],
  ['an unknown key of a case', { wavelenghtNm: 500 }, 'wavelenghtNm', /nearest known one is wavelengthNm/],
  ['an unknown key of a layer', withFilm({ voight: 0.1 }), 'layers[0].voight', /nearest known one is voigt/],
  [
    'an unknown key inside two blocks',
    { layers: [{ repeat: 2, layers: [{ repeat: 2, layers: [{ ...film, tickness: 1 }] }] }] },
    'layers[0].layers[0].layers[0].tickness',
    /nearest known one is thicknessNm/,
  ],
];

/** What needs more than one field. */
const RULES: Line[] = [
  [
    'an absorbing incident medium',
    { incident: { index: [1, 0.1] } },
    'incident.index',
    /must not absorb.*0.1/,
  ],
  ['a magnetic incident medium', { incident: { index: 1, voigt: 0.1 } }, 'incident.voigt', /not be magnetic/],
  [
    'an anisotropic incident medium',
    { incident: { index: 1, quadratic } },
    'incident.quadratic',
    /must be isotropic/,
  ],
  ['an incident tensor', { incident: { epsilon: identity } }, 'incident.epsilon', /must be isotropic/],
  ['four blocks deep', { layers: nested(4) }, 'layers[0].layers[0].layers[0].layers[0].layers', /3 deep/],
  [
    'more than 100,000 layers',
    { layers: [{ repeat: 1000, layers: [{ repeat: 101, layers: [film] }] }] },
    'layers',
    /at most 100000 layers after blocks are expanded, got 101000/,
  ],
  [
    'more samples than wavelengths',
    { wavelengthNm: [500, 600], substrate: { index: { samples: [1, 2, 3] } } },
    'substrate.index.samples',
    /one entry per wavelength \(2\), got 3/,
  ],
  [
    'fewer samples of voigt than wavelengths',
    { wavelengthNm: [500, 600], ...withFilm({ voigt: { samples: [0.1] }, m: [0, 0, 1] }) },
    'layers[0].voigt.samples',
    /one entry per wavelength \(2\), got 1/,
  ],
  [
    'a magnetic slab with backside',
    {
      substrate: { index: 1.5, voigt: 0.1, m: [0, 0, 1] },
      backside: { incoherent: true, thicknessNm: 1e5, exit: { index: 1 } },
    },
    'substrate.voigt',
    /must not be magnetic/,
  ],
  [
    'an anisotropic slab with backside',
    {
      substrate: { epsilon: identity },
      backside: { incoherent: true, thicknessNm: 1e5, exit: { index: 1 } },
    },
    'substrate.epsilon',
    /must be isotropic/,
  ],
];

describe.each([
  ['fields', FIELDS],
  ['rules', RULES],
])('%s', (_name, lines) => {
  let status = -1;
  let output = '';
  let issues: Issue[] = [];
  beforeAll(async () => {
    const input = JSON.stringify({ cases: lines.map(([, change]) => ({ ...base, ...change })) });
    ({ status, output } = await solve(input.replaceAll('"INF"', '1e999')));
    issues = errorEnvelopeSchema.parse(JSON.parse(output)).error.issues ?? [];
  });

  test('status 1 and nothing solved', () => {
    expect(status).toBe(1);
    expect(output).not.toContain('"results"');
  });

  test.each(lines.map(([what, , where, message], index) => ({ what, where, message, index })))(
    '$what',
    ({ where, message, index }) => {
      const prefix = `cases[${index}].`;
      const own = issues.filter((issue) => issue.path.startsWith(prefix));
      expect(own.map((issue) => issue.path)).toContain(`${prefix}${where}`);
      expect(own.find((issue) => issue.path === `${prefix}${where}`)?.message).toMatch(message);
      // Nothing beside the point is complained about.
      expect(own).toHaveLength(1);
    },
  );
});

test('what stands just inside the limits is accepted', async () => {
  const changes = [
    { layers: nested(3) },
    {
      layers: [
        { repeat: 0, layers: [film] },
        { repeat: 1000, layers: [film] },
      ],
    },
    withFilm({ voigt: 0.1, m: [0, 0, 1 + 5e-10] }),
    { angleDeg: 89.999999 },
    withFilm({ thicknessNm: 0 }),
    withFilm({ extraordinary: 2, axis: [0, 0, 1e-3] }),
    { wavelengthNm: [500, 600], substrate: { index: { samples: [1, [2, 1]] } } },
  ];
  const cases = changes.map((change) => ({ ...base, ...change }));
  const { status, output } = await solve(JSON.stringify({ cases }));
  expect([status, output.slice(0, 12)]).toEqual([0, '{"results":[']);
});
