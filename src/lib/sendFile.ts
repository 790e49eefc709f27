import type { z } from 'zod';
import { acceptAnswer, apiBase, readAnswer, unreachable } from './apiClient.ts';

type SendFile<Schema extends z.ZodType> = {
  /** Path under /api/v1. */
  path: string;
  file: File;
  schema: Schema;
  /** Told the share of the bytes that have left, 0..1. */
  onProgress: (share: number) => void;
  signal?: AbortSignal | undefined;
};

/**
 * Sends one file as the multipart field `file`. By XMLHttpRequest, since fetch does not tell how much has left.
 * Rejects as `request` of apiClient.ts does.
 */
export async function sendFile<Schema extends z.ZodType>(
  options: SendFile<Schema>,
): Promise<z.output<Schema>> {
  const answer = await acceptAnswer(options.path, await send(options));
  return readAnswer(answer, options.schema);
}

function send({ path, file, onProgress, signal }: Omit<SendFile<z.ZodType>, 'schema'>): Promise<Response> {
  return new Promise((resolve, reject) => {
    const sending = new XMLHttpRequest();
    sending.open('POST', apiBase + path);
    sending.setRequestHeader('accept', 'application/json');
    sending.upload.addEventListener('progress', ({ loaded, total, lengthComputable }) => {
      if (lengthComputable && total > 0) onProgress(loaded / total);
    });
    sending.addEventListener('load', () => {
      const requestId = sending.getResponseHeader('x-request-id');
      const headers = new Headers(requestId === null ? [] : [['x-request-id', requestId]]);
      resolve(new Response(sending.responseText, { status: sending.status, headers }));
    });
    sending.addEventListener('error', () => reject(unreachable()));
    sending.addEventListener('abort', () =>
      reject(new DOMException('The upload was stopped.', 'AbortError')),
    );
    signal?.addEventListener('abort', () => sending.abort());
    const body = new FormData();
    body.append('file', file);
    sending.send(body);
  });
}
