// @vitest-environment jsdom
import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { ApiError, noContent, onUnauthenticated, request, requestBinary } from './apiClient.ts';
import { startTestServer } from './testServer.ts';

const server = startTestServer();

afterEach(() => onUnauthenticated(() => undefined));

const filmSchema = z.object({ name: z.string(), layers: z.int() });
const film = () => request({ path: '/films/1', schema: filmSchema });

async function failureOf(promise: Promise<unknown>): Promise<ApiError> {
  const error = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof ApiError)) throw new Error(`expected an ApiError, got ${String(error)}`);
  return error;
}

describe('request', () => {
  it('gives what the schema makes of the answer and sends JSON under /api/v1', async () => {
    const seen: { method: string | undefined; url: string | undefined; body: string; key: unknown }[] = [];
    server.answer((incoming, response) => {
      let body = '';
      incoming.on('data', (part: Buffer) => (body += part.toString()));
      incoming.on('end', () => {
        seen.push({
          method: incoming.method,
          url: incoming.url,
          body,
          key: incoming.headers['idempotency-key'],
        });
        response.writeHead(201, { 'content-type': 'application/json' });
        response.end(JSON.stringify({ name: 'Pt/Co/Pt', layers: 3, unknown: 'dropped' }));
      });
    });
    const made = await request({
      method: 'POST',
      path: '/films',
      body: { name: 'Pt/Co/Pt' },
      headers: { 'idempotency-key': 'k1' },
      schema: filmSchema,
    });
    expect(made).toEqual({ name: 'Pt/Co/Pt', layers: 3 });
    expect(seen).toEqual([{ method: 'POST', url: '/api/v1/films', body: '{"name":"Pt/Co/Pt"}', key: 'k1' }]);
  });

  it.each([202, 204])('takes %i without a body as no content', async (status) => {
    server.answer((_request, response) => response.writeHead(status).end());
    expect(await request({ method: 'DELETE', path: '/films/1', schema: noContent })).toBeUndefined();
  });

  it('does not take an empty answer for a film', async () => {
    server.answer((_request, response) => response.writeHead(200).end());
    expect(await failureOf(film())).toMatchObject({ status: 200, code: 'unreadable' });
  });

  it('refuses an answer that does not fit the schema and says where', async () => {
    server.answerJson(200, { name: 'Pt/Co/Pt', layers: 'three' }, { 'x-request-id': 'req-1' });
    const error = await failureOf(film());
    expect(error).toMatchObject({ status: 200, code: 'unreadable', requestId: 'req-1' });
    expect(error.message).toContain('layers');
  });

  it('carries code, issues and request id of the envelope', async () => {
    const issues = [{ path: 'layers[2].thicknessNm', message: 'must be >= 0, got -2' }];
    server.answerJson(422, {
      error: { code: 'invalid', message: 'The stack is refused.', issues, requestId: 'req-2' },
    });
    const error = await failureOf(film());
    expect(error).toMatchObject({
      status: 422,
      code: 'invalid',
      message: 'The stack is refused.',
      issues,
      requestId: 'req-2',
    });
  });

  it('knows a gateway that answers for a stopped server', async () => {
    server.answer((_request, response) => {
      response.writeHead(502, { 'content-type': 'text/html' });
      response.end('<h1>Bad gateway</h1>');
    });
    expect(await failureOf(film())).toMatchObject({ status: 502, code: 'unavailable' });
  });

  it('tells a lost connection from a refusal', async () => {
    server.answer((incoming) => incoming.socket.destroy());
    expect(await failureOf(film())).toMatchObject({ status: 0, code: 'network' });
  });

  it('reports an ended session, but not a failed sign-in', async () => {
    const ended = vi.fn();
    onUnauthenticated(ended);
    server.answerJson(401, { error: { code: 'unauthenticated', message: 'Sign in first.' } });
    await failureOf(request({ method: 'POST', path: '/session', body: {}, schema: filmSchema }));
    expect(ended).not.toHaveBeenCalled();
    expect(await failureOf(film())).toMatchObject({ status: 401, code: 'unauthenticated' });
    expect(ended).toHaveBeenCalledTimes(1);
  });

  it('rejects as fetch does when it is aborted', async () => {
    server.answer(() => undefined);
    const controller = new AbortController();
    const pending = request({ path: '/films/1', schema: filmSchema, signal: controller.signal });
    controller.abort();
    await expect(pending).rejects.toMatchObject({ name: 'AbortError' });
  });
});

describe('requestBinary', () => {
  it('gives the bytes as they came', async () => {
    server.answer((_request, response) => response.end(Buffer.from(new Float64Array([0.5, -2]).buffer)));
    expect(Array.from(new Float64Array(await requestBinary({ path: '/runs/1/data' })))).toEqual([0.5, -2]);
  });

  it('refuses with the envelope', async () => {
    server.answerJson(410, { error: { code: 'gone', message: 'The link was revoked.' } });
    expect(await failureOf(requestBinary({ path: '/shared/x/data' }))).toMatchObject({
      status: 410,
      code: 'gone',
    });
  });
});
