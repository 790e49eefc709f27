/** One of the two compared: the newest version when `version` is null. */
type Choice = { id: string | null; version: number | null };

/** The two materials as the address names them: `a`, `b`, and `va`, `vb` for versions. */
export function readCompared(search: URLSearchParams): { a: Choice; b: Choice } {
  const choice = (key: 'a' | 'b'): Choice => {
    const version = Number(search.get(`v${key}`));
    return {
      id: search.get(key) || null,
      version: Number.isInteger(version) && version > 0 ? version : null,
    };
  };
  return { a: choice('a'), b: choice('b') };
}

/** Writes them back beside whatever else the address holds. */
export function writeCompared(search: URLSearchParams, compared: { a: Choice; b: Choice }): URLSearchParams {
  const next = new URLSearchParams(search);
  const set = (key: string, value: string | number | null) => {
    if (value === null) next.delete(key);
    else next.set(key, String(value));
  };
  for (const key of ['a', 'b'] as const) {
    set(key, compared[key].id);
    set(`v${key}`, compared[key].version);
  }
  return next;
}
