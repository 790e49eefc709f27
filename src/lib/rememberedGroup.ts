import { useSyncExternalStore } from 'react';

const storageKey = 'skewlight.group';
const listeners = new Set<() => void>();

/**
 * The group a person worked in last. Addresses such as /stacks/:stackId do not name a group, so a page that knows
 * its group says so here and the header follows.
 */
export function rememberGroup(groupId: string): void {
  if (window.localStorage.getItem(storageKey) === groupId) return;
  window.localStorage.setItem(storageKey, groupId);
  listeners.forEach((listener) => listener());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function useRememberedGroup(): string | null {
  return useSyncExternalStore(subscribe, () => window.localStorage.getItem(storageKey));
}
