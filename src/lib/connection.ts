import { useSyncExternalStore } from 'react';

/** Whether answers arrive: from the network, from the server, and from its database. */
export type Connection = 'ok' | 'unreachable' | 'unavailable';

let connection: Connection = 'ok';
const listeners = new Set<() => void>();

/** Called by the API client after every request. */
export function reportConnection(next: Connection): void {
  if (next === connection) return;
  connection = next;
  listeners.forEach((listener) => listener());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function useConnection(): Connection {
  return useSyncExternalStore(subscribe, () => connection);
}
