import { createServer } from 'node:http';
import type { IncomingMessage, Server, ServerResponse } from 'node:http';
import { afterEach, beforeEach, vi } from 'vitest';

type Answer = (request: IncomingMessage, response: ServerResponse) => void;

/**
 * For tests of the client: a real HTTP server on loopback, new for every test, that answers as the test says.
 * Only the origin, which a browser puts before an address by itself, is added by hand.
 */
export function startTestServer() {
  const pageFetch = globalThis.fetch;
  let server: Server;
  let answer: Answer = (_request, response) => response.writeHead(500).end();

  beforeEach(async () => {
    server = createServer((incoming, response) => answer(incoming, response));
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const address = server.address();
    if (address === null || typeof address === 'string') throw new Error('the test server has no port');
    vi.stubGlobal('fetch', (path: string, init: RequestInit) =>
      pageFetch(`http://127.0.0.1:${address.port}${path}`, init),
    );
  });

  afterEach(async () => {
    vi.unstubAllGlobals();
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
  });

  return {
    answer: (next: Answer) => {
      answer = next;
    },
    answerJson: (status: number, body: unknown, headers: Record<string, string> = {}) => {
      answer = (_request, response) => {
        response.writeHead(status, { 'content-type': 'application/json', ...headers });
        response.end(JSON.stringify(body));
      };
    },
  };
}
