import type { z } from 'zod';
import type { Issue } from './error.ts';

type ZodIssue = z.core.$ZodIssue;
type Key = PropertyKey;

/** A path as people read it: `cases[3].layers[0].thicknessNm`. */
export function formatPath(path: readonly Key[]): string {
  return path.reduce<string>(
    (text, key) =>
      typeof key === 'number' ? `${text}[${key}]` : text === '' ? String(key) : `${text}.${String(key)}`,
    '',
  );
}

/**
 * Whether a parsed JSON value is nested deeper than any request of ours; a schema that follows it down would run out
 * of stack. Looked at without recursion, for the same reason.
 */
export function isNestedTooDeep(input: unknown, limit = 64): boolean {
  let level: unknown[] = [input];
  for (let depth = 0; level.length > 0; depth++) {
    if (depth > limit) return true;
    level = level.flatMap(childrenOf);
  }
  return false;
}

function childrenOf(value: unknown): unknown[] {
  return typeof value === 'object' && value !== null ? Object.values(value) : [];
}

/**
 * Every problem zod found, each with its full path and a remedy in words.
 *
 * @param error what `safeParse` returned
 * @param input the value that was parsed; its offending parts are quoted in the messages
 */
export function describeIssues(error: z.ZodError, input: unknown): Issue[] {
  return error.issues.flatMap((issue) => describe(issue, [], input));
}

function describe(issue: ZodIssue, base: readonly Key[], input: unknown): Issue[] {
  const path = [...base, ...issue.path];
  const here = valueAt(input, path);
  if (issue.code === 'invalid_union') {
    const branch = likeliestBranch(issue.errors);
    // When no branch recognises even the kind of value, the union's own sentence says more than any branch.
    if (!branch || branch.some((inner) => inner.path.length === 0 && inner.code === 'invalid_type')) {
      return [
        {
          path: formatPath(path),
          message: here === undefined ? 'is required' : `${unionWords(issue)}, got ${quote(here)}`,
        },
      ];
    }
    return branch.flatMap((inner) => describe(inner, path, input));
  }
  if (issue.code === 'unrecognized_keys') {
    const messages = issue.message.split('\n');
    return issue.keys.map((key, index) => ({
      path: formatPath([...path, key]),
      message: messages[index] ?? 'is not a known key',
    }));
  }
  return [{ path: formatPath(path), message: sentence(issue, here) }];
}

/** Of a union told apart by one key: what that key may be. */
function unionWords(issue: z.core.$ZodIssueInvalidUnion): string {
  return 'options' in issue && issue.options ? `must be ${oneOf(issue.options)}` : issue.message;
}

function oneOf(values: readonly unknown[]): string {
  return values.map((one) => JSON.stringify(one)).join(' or ');
}

function sentence(issue: ZodIssue, value: unknown): string {
  switch (issue.code) {
    case 'invalid_type':
      if (value === undefined) return 'is required';
      if (typeof value === 'number' && !Number.isFinite(value))
        return `must be a finite number, got ${value}`;
      if (issue.expected === 'int') return `must be a whole number, got ${quote(value)}`;
      return issue.message.startsWith('Invalid input')
        ? `must be ${article(issue.expected)}, got ${quote(value)}`
        : `${issue.message}, got ${quote(value)}`;
    case 'too_small':
      // An empty text: the schema's own sentence says what belongs there.
      if (issue.origin === 'string' && issue.minimum === 1) {
        return issue.message.startsWith('Too small') ? 'must not be empty' : issue.message;
      }
      return `must ${limit(issue.origin, issue.inclusive !== false ? '>=' : '>', 'at least', issue.minimum)}${got(value)}`;
    case 'too_big':
      return `must ${limit(issue.origin, issue.inclusive !== false ? '<=' : '<', 'at most', issue.maximum)}${got(value)}`;
    case 'invalid_value':
      return `must be ${oneOf(issue.values)}, got ${quote(value)}`;
    case 'custom':
      return issue.message;
    default:
      return issue.message;
  }
}

function limit(origin: string, comparison: string, words: string, bound: number | bigint): string {
  if (origin === 'array') return `have ${words} ${bound} ${bound === 1 ? 'entry' : 'entries'}`;
  if (origin === 'string') return `have ${words} ${bound} characters`;
  return `be ${comparison} ${bound}`;
}

function got(value: unknown): string {
  if (Array.isArray(value)) return `, got ${value.length}`;
  return typeof value === 'string' ? '' : `, got ${quote(value)}`;
}

function article(expected: string): string {
  return /^[aeio]/.test(expected) ? `an ${expected}` : `a ${expected}`;
}

function quote(value: unknown): string {
  if (typeof value === 'number') return String(value);
  const text = JSON.stringify(value) ?? typeof value;
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
}

/**
 * The branch of a union that the input was most likely meant for: the one whose complaints are about values
 * rather than about missing or unknown keys.
 */
function likeliestBranch(branches: readonly ZodIssue[][]): ZodIssue[] | undefined {
  let best: ZodIssue[] | undefined;
  let bestScore = Infinity;
  for (const branch of branches) {
    const score = branch.reduce((sum, issue) => sum + mismatch(issue), 0);
    if (score < bestScore) {
      best = branch;
      bestScore = score;
    }
  }
  return best;
}

function mismatch(issue: ZodIssue): number {
  if (issue.code === 'unrecognized_keys') return 20 * issue.keys.length;
  // Wrong at the root of the branch: an object where an array was meant, or the other way round.
  if (issue.path.length === 0 && issue.code !== 'custom') return 100;
  return issue.code === 'custom' ? 1 : 10;
}

function valueAt(input: unknown, path: readonly Key[]): unknown {
  let value = input;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = (value as Record<Key, unknown>)[key];
  }
  return value;
}
