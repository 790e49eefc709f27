import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { materialImportSchema } from '../../../../shared/materialImport.ts';
import type { MaterialImport } from '../../../../shared/materialImport.ts';
import { request } from '../../../lib/apiClient.ts';
import { sendFile } from '../../../lib/sendFile.ts';

const POLL_MS = 300;

/** One import; asked for again while the table is being read. */
export function importQuery(importId: string) {
  return queryOptions({
    queryKey: ['imports', importId],
    queryFn: ({ signal }) =>
      request({ path: `/imports/${encodeURIComponent(importId)}`, schema: materialImportSchema, signal }),
    refetchInterval: ({ state }) => (state.data?.state === 'reading' ? POLL_MS : false),
  });
}

/** Sends a file or a pasted table; `share` is how much of the file has left, null when nothing is on its way. */
export function useSendTable(groupId: string, onSent: (sent: MaterialImport) => void) {
  const client = useQueryClient();
  const [share, setShare] = useState<number | null>(null);
  const path = `/groups/${groupId}/imports`;
  const keep = (sent: MaterialImport) => {
    client.setQueryData(importQuery(sent.id).queryKey, sent);
    onSent(sent);
  };
  const upload = useMutation({
    mutationFn: ({ file, signal }: { file: File; signal: AbortSignal }) => {
      setShare(0);
      return sendFile({ path, file, schema: materialImportSchema, onProgress: setShare, signal });
    },
    onSuccess: keep,
    onSettled: () => setShare(null),
  });
  const paste = useMutation({
    mutationFn: (text: string) =>
      request({ method: 'POST', path, body: { text }, schema: materialImportSchema }),
    onSuccess: keep,
  });
  return { upload, paste, share };
}
