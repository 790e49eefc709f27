import { useCallback, useState } from 'react';

/** Up to two picked ids; a third takes the place of the first. */
export function usePicked(): [readonly string[], (id: string) => void] {
  const [picked, setPicked] = useState<readonly string[]>([]);
  const toggle = useCallback(
    (id: string) =>
      setPicked((before) =>
        before.includes(id) ? before.filter((one) => one !== id) : [...before.slice(-1), id],
      ),
    [],
  );
  return [picked, toggle];
}
