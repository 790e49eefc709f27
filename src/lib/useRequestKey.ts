import { useRef } from 'react';

/**
 * An Idempotency-Key for what a form sends: the same body sent again (a second press, an answer that was lost) bears the
 * same key and makes one thing; another body is another thing.
 */
export function useRequestKey(): (body: object) => string {
  const last = useRef<{ text: string; key: string } | null>(null);
  return (body) => {
    const text = JSON.stringify(body);
    if (last.current?.text !== text) last.current = { text, key: crypto.randomUUID() };
    return last.current.key;
  };
}
