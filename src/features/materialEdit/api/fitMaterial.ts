import { useMutation } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { fitResultSchema } from '../../../../shared/materialFit.ts';
import type { FitMaterial } from '../../../../shared/materialFit.ts';
import { request } from '../../../lib/apiClient.ts';

/** A fit on the server. It ends there too when it is cancelled or its place on the page goes. */
export function useFit(groupId: string) {
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);
  const fit = useMutation({
    mutationFn: (body: FitMaterial) => {
      running.current?.abort();
      running.current = new AbortController();
      const { signal } = running.current;
      return request({
        method: 'POST',
        path: `/groups/${groupId}/fits`,
        body,
        schema: fitResultSchema,
        signal,
      });
    },
  });
  const { mutate, reset, isPending, error } = fit;
  const cancel = () => {
    running.current?.abort();
    reset();
  };
  return { mutate, cancel, isPending, error };
}
