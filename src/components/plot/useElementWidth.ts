import { useEffect, useState } from 'react';

/** Width of an element as it is laid out, px; `fallback` before that and where nothing is laid out (tests). */
export function useElementWidth(
  fallback: number,
): [ref: (element: HTMLElement | null) => void, width: number] {
  const [element, setElement] = useState<HTMLElement | null>(null);
  const [width, setWidth] = useState(fallback);
  useEffect(() => {
    if (element === null || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry && entry.contentRect.width > 0) setWidth(Math.round(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [element]);
  return [setElement, width];
}
