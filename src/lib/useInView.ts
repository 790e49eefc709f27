import { useEffect, useRef, useState } from 'react';
import type { RefObject } from 'react';

/** True once the element has come near the visible part of the page; for loading what only then is needed. */
export function useInView<Target extends Element>(): [RefObject<Target | null>, boolean] {
  const target = useRef<Target>(null);
  // Where nothing can be observed (tests, very old browsers) everything counts as visible.
  const [seen, setSeen] = useState(typeof IntersectionObserver === 'undefined');
  useEffect(() => {
    const element = target.current;
    if (seen || !element) return undefined;
    const observer = new IntersectionObserver(
      (entries) => {
        if (entries.some((entry) => entry.isIntersecting)) setSeen(true);
      },
      { rootMargin: '200px' },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [seen]);
  return [target, seen];
}
