import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useConnection } from '../../../lib/connection.ts';
import type { Connection } from '../../../lib/connection.ts';
import { healthQuery } from '../api/health.ts';

const everyMs = 4000;

/** While answers stay away, asks after the server's health; once it is well again, loads everything anew. */
export function useReconnect(): Connection {
  const connection = useConnection();
  const client = useQueryClient();
  const away = connection !== 'ok';
  useQuery({ ...healthQuery(), enabled: away, refetchInterval: away ? everyMs : false, retry: false });
  useEffect(() => {
    if (!away) return undefined;
    return () => void client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'health' });
  }, [away, client]);
  return connection;
}
