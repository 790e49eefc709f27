// @vitest-environment jsdom
import { createServer } from 'node:http';
import type { Server } from 'node:http';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ApiError } from './apiClient.ts';
import { sendFile } from './sendFile.ts';

declare const jsdom: { reconfigure(settings: { url: string }): void };

const sentSchema = z.object({ id: z.string() });
let server: Server;
let answer: { status: number; body: unknown };
let seen: { url: string | undefined; type: string | undefined; body: string }[];

beforeEach(async () => {
  seen = [];
  server = createServer((request, response) => {
    let body = '';
    request.on('data', (part: Buffer) => (body += part.toString()));
    request.on('end', () => {
      response.setHeader('access-control-allow-origin', '*');
      response.setHeader('access-control-expose-headers', 'x-request-id');
      if (request.method === 'OPTIONS') return void response.writeHead(204).end();
      seen.push({ url: request.url, type: request.headers['content-type'], body });
      response.writeHead(answer.status, { 'content-type': 'application/json', 'x-request-id': 'r1' });
      response.end(JSON.stringify(answer.body));
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('the test server has no port');
  // Relative addresses lead there then. jsdom still takes it for another origin, hence the headers above.
  jsdom.reconfigure({ url: `http://127.0.0.1:${address.port}/` });
});

afterEach(() => {
  server.closeAllConnections();
  server.close();
});

const shares: number[] = [];
const send = (signal?: AbortSignal) =>
  sendFile({
    path: '/groups/g1/imports',
    file: new File(['500;2;3\n'], 'gold.csv'),
    schema: sentSchema,
    onProgress: (share) => shares.push(share),
    signal,
  });

describe('sendFile', () => {
  it('sends the file as one part under its name, tells how much has left, and parses the answer', async () => {
    answer = { status: 202, body: { id: 'i1', more: 'dropped' } };
    expect(await send()).toEqual({ id: 'i1' });
    expect(seen[0]?.url).toBe('/api/v1/groups/g1/imports');
    expect(seen[0]?.type).toMatch(/^multipart\/form-data/);
    expect(seen[0]?.body).toContain('name="file"; filename="gold.csv"');
    expect(seen[0]?.body).toContain('500;2;3');
    expect(shares.at(-1)).toBe(1);
  });

  it('rejects with what the server says', async () => {
    answer = { status: 413, body: { error: { code: 'too-large', message: 'At most 20 MB.' } } };
    const error = await send().catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(ApiError);
    expect(error).toMatchObject({
      status: 413,
      code: 'too-large',
      message: 'At most 20 MB.',
      requestId: 'r1',
    });
  });

  it('ends when it is stopped', async () => {
    answer = { status: 202, body: { id: 'i1' } };
    const stop = new AbortController();
    const sending = send(stop.signal);
    stop.abort();
    await expect(sending).rejects.toMatchObject({ name: 'AbortError' });
  });
});
