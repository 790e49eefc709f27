import { useState } from 'react';

/** Of two values that change by turns, the one that changed last; null is no change. */
export function useChangedLast<Value>(first: Value | null, second: Value | null): Value | null {
  const [seen, setSeen] = useState({ first, second, last: first ?? second });
  if (first === seen.first && second === seen.second) return seen.last;
  const changed = first !== seen.first ? first : second;
  const next = { first, second, last: changed ?? seen.last };
  setSeen(next);
  return next.last;
}
