import type { QueryClient } from '@tanstack/react-query';
import type { Session } from '../../../../shared/account.ts';
import { sessionQuery } from './session.ts';

/** Another person, or nobody: everything that was loaded for the one before is dropped. */
export function replaceSession(client: QueryClient, session: Session | null): void {
  client.setQueryData(sessionQuery().queryKey, session);
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' && !query.isActive() });
  void client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
}
