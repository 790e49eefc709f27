import { z } from 'zod';
import { errorEnvelopeSchema } from '../../shared/error.ts';
import type { ErrorCode, Issue } from '../../shared/error.ts';
import { reportConnection } from './connection.ts';

export const apiBase = '/api/v1';

/** Codes of the server, and two that arise here: no answer at all, and an answer that is not what was agreed. */
export type ApiErrorCode = ErrorCode | 'network' | 'unreadable';

/** Every failed request rejects with this. `status` is 0 when no answer came. */
export class ApiError extends Error {
  override readonly name = 'ApiError';

  constructor(
    readonly status: number,
    readonly code: ApiErrorCode,
    message: string,
    readonly issues: Issue[] = [],
    readonly requestId: string | null = null,
  ) {
    super(message);
  }
}

type Method = 'GET' | 'POST' | 'PATCH' | 'DELETE';

type BinaryRequest = {
  /** Path under /api/v1, such as `/stacks/abc`. */
  path: string;
  signal?: AbortSignal | undefined;
};

type JsonRequest<Schema extends z.ZodType> = BinaryRequest & {
  method?: Method;
  body?: unknown;
  /** Beyond those of JSON, such as `idempotency-key`. */
  headers?: Record<string, string>;
  /** What the answer must be; `noContent` where the server answers without a body (202, 204). */
  schema: Schema;
};

export const noContent = z.undefined();

let unauthenticatedHandler = (): void => undefined;

/** What to do when the session has ended under a page that needs one; signing in itself does not count. */
export function onUnauthenticated(handler: () => void): void {
  unauthenticatedHandler = handler;
}

/**
 * One JSON request. The answer is parsed with the shared schema, so a caller never holds an unchecked value.
 *
 * @throws ApiError for a refusal, for no answer (`network`) and for an answer that does not fit (`unreadable`);
 * an aborted request rejects with the DOMException of fetch.
 */
export async function request<Schema extends z.ZodType>(
  options: JsonRequest<Schema>,
): Promise<z.output<Schema>> {
  const { method = 'GET', path, body, headers, schema, signal } = options;
  const response = await answerTo(path, {
    method,
    headers: {
      accept: 'application/json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...headers,
    },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    ...(signal ? { signal } : {}),
  });
  return readAnswer(response, schema);
}

/** The answer as its schema makes it. Rejects as `request` does. */
export async function readAnswer<Schema extends z.ZodType>(
  response: Response,
  schema: Schema,
): Promise<z.output<Schema>> {
  const received = await readJson(response);
  const parsed = schema.safeParse(received);
  if (parsed.success) return parsed.data;
  const first = parsed.error.issues[0];
  const where = first?.path.length ? `${first.path.join('.')}: ` : '';
  throw new ApiError(
    response.status,
    'unreadable',
    `The server's answer is not what this page expects (${where}${first?.message ?? 'unknown'}). Reload the page: it may be older than the server.`,
    [],
    response.headers.get('x-request-id'),
  );
}

/** One binary answer, such as the stored values of a run; to a question with a body, by POST. Rejects as `request` does. */
export async function requestBinary({
  path,
  body,
  signal,
}: BinaryRequest & { body?: unknown }): Promise<ArrayBuffer> {
  const response = await answerTo(path, {
    ...(body === undefined
      ? {}
      : { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) }),
    ...(signal ? { signal } : {}),
  });
  return response.arrayBuffer();
}

/** Fetches and turns everything but success into an ApiError. */
async function answerTo(path: string, init: RequestInit): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(apiBase + path, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (isAbort(error)) throw error;
    throw unreachable();
  }
  return acceptAnswer(path, response);
}

/** The failure of a request that no answer came to. */
export function unreachable(): ApiError {
  reportConnection('unreachable');
  return new ApiError(0, 'network', 'The server cannot be reached. Check the connection, then try again.');
}

/** The answer if it is a success; rejects with the refusal in it otherwise. */
export async function acceptAnswer(path: string, response: Response): Promise<Response> {
  reportConnection(response.status === 503 ? 'unavailable' : 'ok');
  if (response.ok) return response;
  if (response.status === 401 && path !== '/session') unauthenticatedHandler();
  throw await refusalOf(response);
}

async function refusalOf(response: Response): Promise<ApiError> {
  const requestId = response.headers.get('x-request-id');
  const envelope = errorEnvelopeSchema.safeParse(await readJson(response).catch(() => null));
  if (!envelope.success) {
    // A proxy that answers for a stopped server sends a page, not an envelope.
    const gateway = response.status >= 502 && response.status <= 504;
    if (gateway) reportConnection('unavailable');
    return new ApiError(
      response.status,
      gateway ? 'unavailable' : 'internal',
      gateway
        ? 'The server does not answer at the moment. Try again in a little while.'
        : `The server answered with status ${response.status} and no explanation. Try again.`,
      [],
      requestId,
    );
  }
  const { code, message, issues, requestId: stated } = envelope.data.error;
  return new ApiError(response.status, code, message, issues, stated ?? requestId);
}

/** The body as JSON; undefined when there is none. */
async function readJson(response: Response): Promise<unknown> {
  try {
    const text = await response.text();
    return text === '' ? undefined : JSON.parse(text);
  } catch (error) {
    if (isAbort(error)) throw error;
    throw new ApiError(
      response.status,
      'unreadable',
      'The server answered with something that is not JSON. Try again; if it stays, report the request id.',
      [],
      response.headers.get('x-request-id'),
    );
  }
}

/** By its name: the browser, Node and jsdom each have a DOMException of their own. */
function isAbort(error: unknown): boolean {
  return error instanceof Object && 'name' in error && error.name === 'AbortError';
}
