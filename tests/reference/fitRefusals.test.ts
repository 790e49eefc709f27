import { expect, test } from 'vitest';
import type { PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';
import type { Issue } from '../../shared/error.ts';
import type { FitInput } from '../../worker/fit/fitMaterial.ts';
import { fitMaterial } from '../../worker/fit/fitMaterial.ts';
import { buildContent } from './fitContent.ts';

const index: PlainIndex = {
  kind: 'table',
  wavelengthsNm: [400, 500, 600, 700],
  n: [1.53, 1.52, 1.515, 1.512],
  k: [0, 0, 0, 0],
};
const rangeNm: [number, number] = [400, 700];
const cauchy: PlainIndex = {
  kind: 'model',
  rangeNm,
  model: { name: 'cauchy', a: 1.5, bUm2: 0.01, cUm4: 0 },
};
const lines: PlainVoigt = {
  kind: 'lines',
  rangeNm: [400, 900],
  of: 'gyration',
  lines: [{ shape: 'paramagnetic', amplitude: 0.1, centreEv: 2, dampingEv: 0.5 }],
};
const voigt: PlainVoigt = {
  kind: 'table',
  wavelengthsNm: [500, 700, 900],
  q: [
    [0.01, 0],
    [0.02, 0],
    [0.03, 0],
  ],
};
const plain: FitInput = { target: 'index', start: cauchy, content: buildContent({ index }) };
const many = Array.from({ length: 200_000 }, (_, i) => 400 + i * 1e-3);

test.each<[string, Partial<FitInput>, string, RegExp]>([
  ['a table to start from', { start: index }, 'start.kind', /must be a model, lines or a formula, got table/],
  ['lines for an index', { start: lines }, 'start.kind', /where n and k are fitted, got lines/],
  [
    'a material without a table of n and k',
    { content: buildContent({ index: cauchy }) },
    'target',
    /n and k are given as a model: choose a material with a table/,
  ],
  ['a material without Q', { target: 'voigt', start: lines }, 'target', /this material has no Q/],
  [
    'an index model for Q',
    { target: 'voigt', content: buildContent({ index, voigt }) },
    'start.kind',
    /must be lines or a formula where Q is fitted, got a model/,
  ],
  [
    'a formula of N for Q',
    {
      target: 'voigt',
      start: { kind: 'formula', expression: 'c1', coefficients: [1], rangeNm, quantity: 'N' },
      content: buildContent({ index, voigt }),
    },
    'start.quantity',
    /must be left out where Q is fitted/,
  ],
  [
    'lines of a gyration beyond the index',
    { target: 'voigt', start: lines, content: buildContent({ index, voigt }) },
    'rangeNm',
    /known from 400 to 700 nm; 900 nm was asked.*lines of the gyration need it/,
  ],
  [
    'a range beyond the table',
    { rangeNm: [800, 900] },
    'rangeNm',
    /must hold points of the table \(400 to 700 nm\).*got 800 to 900 nm/,
  ],
  ['a range from long to short', { rangeNm: [700, 400] }, 'rangeNm', /shortest wavelength first/],
  [
    'fewer numbers than parameters',
    { rangeNm: [400, 600] },
    'rangeNm',
    /holds 3 tabulated points, 3 numbers to compare, which is too few for 3 parameters/,
  ],
  [
    'more points than can be fitted in time',
    {
      start: {
        kind: 'model',
        rangeNm,
        model: {
          name: 'oscillators',
          epsInfinity: 2,
          terms: [
            { kind: 'drude', plasmaEv: 1, dampingEv: 1 },
            { kind: 'lorentz', strength: 1, centreEv: 3, dampingEv: 1 },
          ],
        },
      },
      content: buildContent({
        index: { kind: 'table', wavelengthsNm: many, n: many.map(() => 1.5), k: many.map(() => 0) },
      }),
    },
    'rangeNm',
    /holds 200000 tabulated points, which is too many for 6 parameters: narrow it/,
  ],
  ['an unknown parameter', { fixed: ['a', 'd'] }, 'fixed[1]', /got d: use a, bUm2, cUm4/],
  ['nothing to fit', { fixed: ['a', 'bUm2', 'cUm4'] }, 'fixed', /must leave a parameter to be fitted/],
  [
    'a formula without coefficients',
    { start: { kind: 'formula', expression: '1.5', coefficients: [], rangeNm } },
    'start.coefficients',
    /must have a coefficient/,
  ],
  [
    'a start without a value',
    { start: { kind: 'formula', expression: 'sqrt(c1 - L)', coefficients: [0.5], rangeNm } },
    'start',
    /gives n = 0 at 500 nm.*choose other start values/,
  ],
  [
    'a hostile formula',
    { start: { kind: 'formula', expression: 'import("fs")', coefficients: [1], rangeNm } },
    'start',
    /is not allowed in a formula/,
  ],
  [
    'a centre that is too small',
    {
      start: {
        kind: 'model',
        rangeNm,
        model: {
          name: 'oscillators',
          epsInfinity: 2,
          terms: [{ kind: 'drude', plasmaEv: 1, dampingEv: 1e-9 }],
        },
      },
    },
    'start',
    /terms\[0\].dampingEv must start at 0.000001 or more/,
  ],
])('a fit refuses %s', (_what, overrides, path, message) => {
  expect(refusedIssues({ ...plain, ...overrides })).toContainEqual({
    path,
    message: expect.stringMatching(message) as string,
  });
});

test('every issue is named at once', () => {
  const issues = refusedIssues({ ...plain, rangeNm: [400, 500], fixed: ['x', 'y'] });
  expect(issues.map(({ path }) => path)).toEqual(['fixed[0]', 'fixed[1]', 'rangeNm']);
});

function refusedIssues(input: FitInput): Issue[] {
  try {
    fitMaterial(input);
  } catch (error) {
    if (error instanceof Error && 'issues' in error) return error.issues as Issue[];
    throw error;
  }
  throw new Error('nothing was refused');
}
