import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { complexSchema, toComplex } from '../../shared/complex.ts';
import { solveCaseSchema, solvePointSchema } from '../../shared/solve.ts';
import { solvePoint } from './solvePoint.ts';

// Source: tests/reference/solver-cases.json, computed at 80+ digits by an arbitrary-precision 4x4 solver written
// from the same equations, rounded to doubles. An amplitude that is exactly zero stands there as a plain 0.

const jones = z.object({ pp: complexSchema, ps: complexSchema, sp: complexSchema, ss: complexSchema });
const { R, T, A, kerr } = solvePointSchema.shape;
const referenceSchema = z.object({
  cases: z.array(
    z.object({
      kind: z.string(),
      case: solveCaseSchema,
      expected: z.strictObject({ r: jones, t: jones.nullable(), R, T, A, kerr }),
    }),
  ),
});

const reference = referenceSchema.parse(
  JSON.parse(readFileSync(new URL('./solver-cases.json', import.meta.url), 'utf8')),
);

const TOLERANCE = 1e-9;

/** Every number of a result by its path; null where the result says null. */
function numbersOf(value: unknown, path = ''): [path: string, value: number | null][] {
  if (typeof value === 'number' || value === null) return [[path, value]];
  if (typeof value !== 'object' || value === undefined) throw new Error(`${path} is neither number nor null`);
  return Object.entries(value).flatMap(([key, inner]) => numbersOf(inner, `${path}.${key}`));
}

const asPairs = (j: z.infer<typeof jones>) => ({
  pp: toComplex(j.pp),
  ps: toComplex(j.ps),
  sp: toComplex(j.sp),
  ss: toComplex(j.ss),
});

test('there are 208 cases of 12 kinds', () => {
  expect(reference.cases).toHaveLength(208);
  expect(new Set(reference.cases.map((one) => one.kind)).size).toBe(12);
});

describe('every field of every case agrees to 1e-9', () => {
  test.each(reference.cases.map((one, index) => ({ ...one, index })))('$index $kind', (one) => {
    const { wavelengthNm, angleDeg, ...got } = solvePoint(one.case);
    const { r, t, ...rest } = one.expected;
    expect([wavelengthNm, angleDeg]).toEqual([one.case.wavelengthNm, one.case.angleDeg]);
    const expected = new Map(numbersOf({ ...rest, r: asPairs(r), t: t && asPairs(t) }));
    const found = numbersOf(got);
    expect(found.map(([path]) => path).sort()).toEqual([...expected.keys()].sort());
    for (const [path, value] of found) {
      const wanted = expected.get(path) ?? null;
      if (value === null || wanted === null) expect(value, path).toBe(wanted);
      else expect(Math.abs(value - wanted), path).toBeLessThan(TOLERANCE);
    }
  });
});
