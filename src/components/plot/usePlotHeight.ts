import { useSyncExternalStore } from 'react';

function subscribe(listener: () => void): () => void {
  window.addEventListener('resize', listener);
  return () => window.removeEventListener('resize', listener);
}

/** Height of a figure that fills what the page around it leaves of the screen, within what can be read, px. */
export function usePlotHeight(aroundPx: number): number {
  const screen = useSyncExternalStore(subscribe, () => window.innerHeight);
  return Math.min(560, Math.max(300, screen - aroundPx));
}
