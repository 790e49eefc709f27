import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { describeIssues, formatPath, isNestedTooDeep } from './issues.ts';
import { solveRequestSchema } from './solve.ts';
import { strictObject } from './strictObject.ts';

function issuesOf(schema: z.ZodType, input: unknown) {
  const parsed = schema.safeParse(input);
  return parsed.success ? [] : describeIssues(parsed.error, input);
}

const only = (schema: z.ZodType, input: unknown) => {
  const issues = issuesOf(schema, input);
  expect(issues).toHaveLength(1);
  return issues[0];
};

describe('a path', () => {
  test.each([
    [[], ''],
    [['cases'], 'cases'],
    [['cases', 3, 'layers', 0, 'thicknessNm'], 'cases[3].layers[0].thicknessNm'],
    [[0, 'a', 1, 2], '[0].a[1][2]'],
  ])('%j is written %s', (keys, text) => {
    expect(formatPath(keys)).toBe(text);
  });
});

describe('each kind of problem says what is wanted and what came', () => {
  const schema = strictObject({
    name: z.string().min(2).max(4),
    count: z.int().min(0).max(10),
    positive: z.number().positive().lt(5),
    list: z.array(z.number()).min(1).max(2),
    mode: z.enum(['drawn', 'reversed']),
    flag: z.boolean(),
  });
  const good = { name: 'abc', count: 3, positive: 1, list: [1], mode: 'drawn', flag: true };

  test('a union told apart by a key names what the key may be', () => {
    const union = z.discriminatedUnion('kind', [
      strictObject({ kind: z.literal('cap') }),
      strictObject({ kind: z.literal('tolerance') }),
    ]);
    expect(only(union, { kind: 'anneal' })).toEqual({
      path: 'kind',
      message: 'must be "cap" or "tolerance", got "anneal"',
    });
    expect(only(union, {})).toEqual({ path: 'kind', message: 'is required' });
  });

  test('nothing is wrong with the good one', () => expect(issuesOf(schema, good)).toEqual([]));

  test.each<[object, string, string]>([
    [{ name: undefined }, 'name', 'is required'],
    [{ name: 'a' }, 'name', 'must have at least 2 characters'],
    [{ name: 'abcde' }, 'name', 'must have at most 4 characters'],
    [{ name: 7 }, 'name', 'must be a string, got 7'],
    [{ count: 1.5 }, 'count', 'must be a whole number, got 1.5'],
    [{ count: -1 }, 'count', 'must be >= 0, got -1'],
    [{ count: 11 }, 'count', 'must be <= 10, got 11'],
    [{ positive: 0 }, 'positive', 'must be > 0, got 0'],
    [{ positive: 5 }, 'positive', 'must be < 5, got 5'],
    [{ positive: Infinity }, 'positive', 'must be a finite number, got Infinity'],
    [{ positive: NaN }, 'positive', 'must be a finite number, got NaN'],
    [{ positive: '1' }, 'positive', 'must be a number, got "1"'],
    [{ positive: null }, 'positive', 'must be a number, got null'],
    [{ list: [] }, 'list', 'must have at least 1 entry, got 0'],
    [{ list: [1, 2, 3] }, 'list', 'must have at most 2 entries, got 3'],
    [{ list: {} }, 'list', 'must be an array, got {}'],
    [{ list: [1, 'b'] }, 'list[1]', 'must be a number, got "b"'],
    [{ mode: 'draw' }, 'mode', 'must be "drawn" or "reversed", got "draw"'],
    [{ flag: 1 }, 'flag', 'must be a boolean, got 1'],
  ])('%j', (change, path, message) => {
    expect(only(schema, { ...good, ...change })).toEqual({ path, message });
  });

  test('a long value is quoted in part', () => {
    const issue = only(schema, { ...good, flag: 'x'.repeat(500) });
    expect(issue?.message).toMatch(/^must be a boolean, got "x{20,}\.\.\.$/);
    expect(issue?.message.length).toBeLessThan(100);
  });

  test('all problems are told at once, in order of the fields', () => {
    const issues = issuesOf(schema, { ...good, count: -1, list: [], flag: null });
    expect(issues.map((issue) => issue.path)).toEqual(['count', 'list', 'flag']);
  });
});

describe('unknown keys', () => {
  const schema = strictObject({ thicknessNm: z.number(), voigt: z.number(), index: z.number() });
  const good = { thicknessNm: 1, voigt: 1, index: 1 };

  test.each([
    ['thickness', 'thicknessNm'],
    ['ThicknessNM', 'thicknessNm'],
    ['voight', 'voigt'],
    ['indx', 'index'],
  ])('%s: the nearest known one is %s', (key, nearest) => {
    expect(only(schema, { ...good, [key]: 1 })).toEqual({
      path: key,
      message: `is not a known key; the nearest known one is ${nearest}`,
    });
  });

  test('several are several issues', () => {
    expect(issuesOf(schema, { ...good, voight: 1, indx: 2 }).map((issue) => issue.path)).toEqual([
      'voight',
      'indx',
    ]);
  });

  test('an object without any key has no nearest one', () => {
    expect(only(strictObject({}), { a: 1 })?.message).toBe('is not a known key');
  });
});

describe('a union speaks for the branch that was meant', () => {
  const withLayer = (layer: unknown) => ({
    cases: [
      { wavelengthNm: 500, angleDeg: 0, incident: { index: 1 }, layers: [layer], substrate: { index: 1 } },
    ],
  });
  const layerIssue = (layer: unknown) => only(solveRequestSchema, withLayer(layer));

  test('a layer with a bad number is a layer', () => {
    expect(layerIssue({ thicknessNm: -1, index: 2 })).toEqual({
      path: 'cases[0].layers[0].thicknessNm',
      message: 'must be >= 0, got -1',
    });
  });

  test('a block with a bad layer is a block, however deep', () => {
    const inner = {
      repeat: 2,
      layers: [{ repeat: 3, layers: [{ thicknessNm: 1, index: 2, m: [0, 0, 2] }] }],
    };
    expect(layerIssue(inner)?.path).toBe('cases[0].layers[0].layers[0].layers[0].m');
  });

  test('a block with a bad repeat is a block', () => {
    expect(layerIssue({ repeat: -1, layers: [] })).toEqual({
      path: 'cases[0].layers[0].repeat',
      message: 'must be >= 0, got -1',
    });
  });

  test.each([7, null, 'Fe', [1]])('%j is neither', (value) => {
    expect(layerIssue(value)).toEqual({
      path: 'cases[0].layers[0]',
      message: `must be a layer or a block {"repeat", "layers"}, got ${JSON.stringify(value)}`,
    });
  });

  test.each<[unknown, string, RegExp]>([
    [{ samples: [] }, 'index.samples', /at least 1 entry/],
    [{ samples: [1, [2, -3]] }, 'index.samples[1]', /k must be >= 0, got -3/],
    [{ sample: [1] }, 'index.sample', /nearest known one is samples|is required/],
    [[1, -2], 'index', /k must be >= 0, got -2/],
    ['gold', 'index', /must be a number/],
    [true, 'index', /must be a number/],
  ])('index %j', (index, path, message) => {
    const issues = issuesOf(solveRequestSchema, withLayer({ thicknessNm: 1, index }));
    const issue = issues.find((one) => one.path === `cases[0].layers[0].${path}`);
    expect(issue?.message).toMatch(message);
  });

  test('a wavelength may be a number or a list', () => {
    const input = { ...withLayer({ thicknessNm: 1, index: 2 }).cases[0], wavelengthNm: [500, 'red'] };
    expect(only(solveRequestSchema, { cases: [input] })).toEqual({
      path: 'cases[0].wavelengthNm[1]',
      message: 'must be a number, got "red"',
    });
  });
});

describe('isNestedTooDeep', () => {
  test('stops what would overflow the stack of a schema, and lets through what requests need', () => {
    const nested = (depth: number) => {
      let value: unknown = 1;
      for (let i = 0; i < depth; i++) value = [value];
      return value;
    };
    expect(isNestedTooDeep(nested(40))).toBe(false);
    expect(isNestedTooDeep(nested(20_000))).toBe(true);
    expect(isNestedTooDeep({ cases: [{ layers: [] }] })).toBe(false);
  });
});
