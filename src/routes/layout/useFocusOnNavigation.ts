import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

/**
 * After going to another page the keyboard and screen readers go on in its content: the link that was pressed is
 * in the header or gone. A field of the new page that took the focus keeps it.
 */
export function useFocusOnNavigation(): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    const content = document.getElementById('content');
    if (content && !content.contains(document.activeElement)) content.focus({ preventScroll: true });
  }, [pathname]);
}
