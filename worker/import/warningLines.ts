/** So many lines are named in a warning. */
const MOST_LINES = 10;

export function firstLines(lines: readonly number[]): number[] {
  return lines.slice(0, MOST_LINES);
}

/** Such as "line 3", "lines 3, 5" or "lines 3, 5, 9 and 21 more". */
export function describeLines(lines: readonly number[]): string {
  const shown = lines.slice(0, 5).join(', ');
  const more = lines.length > 5 ? ` and ${lines.length - 5} more` : '';
  return `${lines.length === 1 ? 'line' : 'lines'} ${shown}${more}`;
}
