export const MOST_RUNS = 6;

/** The ids in the address, each once, at most as many as a plot can hold. */
export function readRunIds(search: URLSearchParams): string[] {
  const named = (search.get('runs') ?? '').split(',').filter((id) => id !== '');
  return [...new Set(named)].slice(0, MOST_RUNS);
}
