import { describe, expect, test } from 'vitest';
import { LIMITS } from './limits.ts';
import type { TensorInput } from './medium.ts';
import type { SolveCase, StackItemInput } from './solve.ts';
import { solveRequestSchema } from './solve.ts';
import { checkSolveRequest, forEachMedium } from './solveRules.ts';

const film = { thicknessNm: 5, index: 2 };
const TENSOR: TensorInput = [
  [2, 0, 0],
  [0, 2, 0],
  [0, 0, 2],
];
const base: SolveCase = {
  wavelengthNm: 500,
  angleDeg: 0,
  incident: { index: 1 },
  layers: [film],
  substrate: { index: 1.5 },
};

/** Every change passes the schema first, as the rules may rely on. */
function issuesOf(change: Partial<SolveCase>, maxPoints = 100) {
  const request = solveRequestSchema.parse({ cases: [base, { ...base, ...change }] });
  return checkSolveRequest(request, { maxPoints, beyond: 'start a run instead' });
}

const blocks = (depth: number): StackItemInput[] =>
  depth === 0 ? [film] : [{ repeat: 2, layers: blocks(depth - 1) }];

test('a plain case has no issue', () => expect(issuesOf({})).toEqual([]));

describe('samples', () => {
  test('one per wavelength, in each key that may be sampled', () => {
    const issues = issuesOf({
      wavelengthNm: [500, 600],
      incident: { index: { samples: [1, 1, 1] } },
      layers: [
        { thicknessNm: 1, index: { samples: [2, 2] }, voigt: { samples: [0.1] }, m: [0, 0, 1] },
        {
          repeat: 2,
          layers: [{ thicknessNm: 1, epsilon: { samples: [TENSOR] } }],
        },
      ],
      substrate: { index: 2, extraordinary: { samples: [3] }, axis: [0, 0, 1] },
    });
    expect(issues).toEqual([
      { path: 'cases[1].incident.index.samples', message: 'must have one entry per wavelength (2), got 3' },
      { path: 'cases[1].layers[0].voigt.samples', message: 'must have one entry per wavelength (2), got 1' },
      {
        path: 'cases[1].layers[1].layers[0].epsilon.samples',
        message: 'must have one entry per wavelength (2), got 1',
      },
      {
        path: 'cases[1].substrate.extraordinary.samples',
        message: 'must have one entry per wavelength (2), got 1',
      },
    ]);
  });

  test('a single wavelength takes a list of one', () => {
    expect(issuesOf({ substrate: { index: { samples: [2] } } })).toEqual([]);
  });
});

describe('the incident medium', () => {
  test.each<[SolveCase['incident'], string, RegExp]>([
    [{ index: [1, 0.5] }, 'index', /must not absorb: k must be 0, got 0.5/],
    [{ index: [0, 1] }, 'index', /must not absorb/],
    [{ index: 1, voigt: 0.1, m: [0, 0, 1] }, 'voigt', /must not be magnetic/],
    [{ index: 1, m: [0, 0, 1] }, 'm', /must not be magnetic/],
    [{ index: 1, extraordinary: 1.1, axis: [1, 0, 0] }, 'extraordinary', /must be isotropic/],
    [{ epsilon: TENSOR }, 'epsilon', /must be isotropic/],
  ])('%j', (incident, key, message) => {
    const issue = issuesOf({ incident }).find((one) => one.path === `cases[1].incident.${key}`);
    expect(issue?.message).toMatch(message);
  });

  test('names the sample that absorbs', () => {
    const incident = { index: { samples: [1, [1.3, 0.1]] as [number, [number, number]] } };
    expect(issuesOf({ wavelengthNm: [500, 600], incident }).map((issue) => issue.path)).toEqual([
      'cases[1].incident.index.samples[1]',
    ]);
  });
});

describe('blocks', () => {
  test('three deep are taken, the fourth is refused by its own path', () => {
    expect(issuesOf({ layers: blocks(3) })).toEqual([]);
    expect(issuesOf({ layers: blocks(4) })).toEqual([
      {
        path: 'cases[1].layers[0].layers[0].layers[0].layers[0].layers',
        message: 'blocks may be nested at most 3 deep',
      },
    ]);
  });

  test('100,000 layers are taken, one more is refused', () => {
    const most: StackItemInput = { repeat: 1000, layers: Array.from({ length: 100 }, () => film) };
    expect(issuesOf({ layers: [most] })).toEqual([]);
    expect(issuesOf({ layers: [film, most] })).toEqual([
      {
        path: 'cases[1].layers',
        message: `must have at most ${LIMITS.expandedLayers} layers after blocks are expanded, got 100001`,
      },
    ]);
  });

  test('repeat 0 takes its layers away', () => {
    const none: StackItemInput = { repeat: 0, layers: [{ repeat: 1000, layers: [film] }] };
    const most: StackItemInput = { repeat: 1000, layers: Array.from({ length: 100 }, () => film) };
    expect(issuesOf({ layers: [none, most] })).toEqual([]);
  });
});

test('points are counted over all cases, wavelengths times angles', () => {
  const change = { wavelengthNm: [500, 600, 700], angleDeg: [0, 10, 20] };
  expect(issuesOf(change, 10)).toEqual([]);
  expect(issuesOf(change, 9)).toEqual([
    {
      path: 'cases',
      message:
        'must have at most 9 points (wavelengths x angles over all cases), got 10: start a run instead',
    },
  ]);
});

test('every issue of every rule is told at once', () => {
  const issues = issuesOf(
    {
      wavelengthNm: [500, 600],
      incident: { index: [1, 1] },
      layers: blocks(4),
      substrate: { index: { samples: [1] } },
    },
    1,
  );
  expect(issues).toHaveLength(4);
});

test('forEachMedium visits each written medium once, blocks not expanded', () => {
  const paths: string[] = [];
  forEachMedium(
    { ...base, layers: [film, { repeat: 5, layers: [film, { repeat: 2, layers: [film] }] }] },
    (_, path) => paths.push(path),
  );
  expect(paths).toEqual([
    'incident',
    'layers[0]',
    'layers[1].layers[0]',
    'layers[1].layers[1].layers[0]',
    'substrate',
  ]);
});
