import { useSyncExternalStore } from 'react';

function subscribe(listener: () => void): () => void {
  window.addEventListener('resize', listener);
  return () => window.removeEventListener('resize', listener);
}

/** Narrower than this is a phone held upright: a figure as high as its screen would hide what belongs to it. */
const PHONE_PX = 640;

/** Height of a figure that fills what the page around it leaves of the screen, within what can be read, px. */
export function usePlotHeight(aroundPx: number): number {
  const screen = useSyncExternalStore(subscribe, () => window.innerHeight);
  const width = useSyncExternalStore(subscribe, () => window.innerWidth);
  return width < PHONE_PX ? 320 : Math.min(560, Math.max(300, screen - aroundPx));
}
