import { z } from 'zod';

/**
 * An object that refuses keys it does not know and names the nearest one it does. The message holds one line per
 * unknown key, in the order of zod's `keys`; describeIssues makes one issue of each.
 */
export function strictObject<Shape extends z.core.$ZodLooseShape>(shape: Shape) {
  const known = Object.keys(shape);
  return z.strictObject(shape, {
    error: (issue) =>
      issue.code === 'unrecognized_keys'
        ? issue['keys'].map((key) => unknownKey(key, known)).join('\n')
        : undefined,
  });
}

function unknownKey(key: string, known: readonly string[]): string {
  const [nearest] = known
    .map((candidate) => ({ candidate, distance: editDistance(key.toLowerCase(), candidate.toLowerCase()) }))
    .sort((a, b) => a.distance - b.distance);
  return `is not a known key${nearest ? `; the nearest known one is ${nearest.candidate}` : ''}`;
}

/** Levenshtein distance, one row at a time. */
function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = (row[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      next.push(Math.min(change, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[b.length] ?? 0;
}
