import type { ErrorCode, ErrorEnvelope, Issue } from '../shared/error.ts';

/** A refusal meant for the person who asked: its message is shown as it stands. */
export class Refusal extends Error {
  constructor(
    readonly status: number,
    readonly code: ErrorCode,
    message: string,
    readonly issues?: Issue[],
  ) {
    super(message);
    this.name = 'Refusal';
  }

  /** @param requestId also in the log; sent along with every answer of the server's own failures (5xx) */
  toEnvelope(requestId?: string): ErrorEnvelope {
    return {
      error: {
        code: this.code,
        message: this.message,
        ...(this.issues && { issues: this.issues }),
        ...(this.status >= 500 && requestId !== undefined && { requestId }),
      },
    };
  }
}

/** 422: every problem at once, each with its path. */
export function invalid(
  issues: Issue[],
  message = 'The request has mistakes; each is named with its place.',
): Refusal {
  return new Refusal(422, 'invalid', message, issues);
}

/** 401 */
export function unauthenticated(
  message = 'Sign in first, or send an API token as "Authorization: Bearer".',
): Refusal {
  return new Refusal(401, 'unauthenticated', message);
}

/** 403 */
export function forbidden(message: string): Refusal {
  return new Refusal(403, 'forbidden', message);
}

/** 404: also what somebody outside a group gets for its things, so that an id tells nothing. */
export function notFound(what: string, issues?: Issue[]): Refusal {
  return new Refusal(404, 'not-found', `There is no such ${what}, or it is not yours to see.`, issues);
}

/** 409 */
export function conflict(message: string, issues?: Issue[]): Refusal {
  return new Refusal(409, 'conflict', message, issues);
}

/** 410 */
export function gone(message: string): Refusal {
  return new Refusal(410, 'gone', message);
}

/** 413 */
export function tooLarge(message: string): Refusal {
  return new Refusal(413, 'too-large', message);
}

/** 429 */
export function tooManyRequests(message: string): Refusal {
  return new Refusal(429, 'too-many-requests', message);
}

/** 503 */
export function unavailable(message: string): Refusal {
  return new Refusal(503, 'unavailable', message);
}

/** 500: says nothing of the cause, which is in the log under the request id. */
export function internal(): Refusal {
  return new Refusal(500, 'internal', 'Something went wrong on the server. The log has the details.');
}
