import type { Issue } from '../../shared/error.ts';
import { formatPath } from '../../shared/issues.ts';

/** Deeper than anything the schemas allow, and shallow enough for code that calls itself. */
const DEEPEST = 40;

type Part = { value: unknown; path: PropertyKey[] };

/**
 * What no schema looks for and the database or the schemas' own recursion would stumble over: nesting without end,
 * and text that PostgreSQL cannot store (U+0000, half surrogate pairs).
 */
export function hostileParts(input: unknown): Issue[] {
  const waiting: Part[] = [{ value: input, path: [] }];
  for (let part = waiting.pop(); part !== undefined; part = waiting.pop()) {
    const { value, path } = part;
    const message = hostility(value, path.length);
    // The first is enough: nobody sends these by mistake in several places.
    if (message !== null) return [{ path: formatPath(path.slice(0, 8)), message }];
    if (typeof value === 'object' && value !== null) pushChildren(value, path, waiting);
  }
  return [];
}

function pushChildren(value: object, path: PropertyKey[], waiting: Part[]): void {
  if (Array.isArray(value)) {
    value.forEach((inner: unknown, index) => {
      // Numbers are harmless, and a request of a few MB is mostly numbers.
      if (typeof inner !== 'number') waiting.push({ value: inner, path: [...path, index] });
    });
    return;
  }
  for (const [key, inner] of Object.entries(value)) {
    if (!isStorable(key)) waiting.push({ value: key, path });
    if (typeof inner !== 'number') waiting.push({ value: inner, path: [...path, key] });
  }
}

function hostility(value: unknown, depth: number): string | null {
  if (depth > DEEPEST) return `is nested more than ${DEEPEST} deep`;
  if (typeof value === 'string' && !isStorable(value))
    return 'has characters that cannot be stored (U+0000 or half of a pair)';
  return null;
}

const isStorable = (text: string) => !text.includes('\0') && !/\p{Surrogate}/u.test(text);
