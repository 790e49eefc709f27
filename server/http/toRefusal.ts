import { BaseError, ConnectionError, DatabaseError, ConnectionAcquireTimeoutError } from 'sequelize';
import { z } from 'zod';
import { LIMITS } from '../../shared/limits.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import { internal, invalid, notFound, Refusal, tooLarge, unavailable } from '../errors.ts';

/** Errors of Express's own body parser carry a status and a type. */
const bodyErrorSchema = z.object({ status: z.int(), type: z.string() });

/** PostgreSQL is stopping, starting, out of connections or cut off (SQLSTATE classes 08, 53, 57P). */
const AWAY = /^(08|53|57P)|^(ECONNREFUSED|ECONNRESET|EPIPE|ETIMEDOUT|ENOTFOUND)$/;

/** Any error as what the caller is told; what is not meant for people becomes 500 and stays in the log. */
export function toRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (isDatabaseAway(error)) {
    return unavailable('The database does not answer at the moment. Nothing was changed; try again shortly.');
  }
  if (error instanceof ComputeError) return fromComputeError(error);
  if (error instanceof URIError) return notFound('address');
  const body = bodyErrorSchema.safeParse(error);
  return body.success ? fromBodyError(body.data) : internal();
}

/** Whether the cause is a database that cannot be reached, rather than something it answered. */
export function isDatabaseAway(error: unknown): boolean {
  if (error instanceof ConnectionError || error instanceof ConnectionAcquireTimeoutError) return true;
  if (!(error instanceof Error)) return false;
  if (error instanceof DatabaseError) return isAwayCode(error.parent) || isTerminated(error.parent);
  if (error instanceof BaseError) return false;
  return isTerminated(error);
}

function isAwayCode(cause: Error): boolean {
  return 'code' in cause && typeof cause.code === 'string' && AWAY.test(cause.code);
}

const isTerminated = (cause: Error) =>
  /connection terminated|client has encountered a connection error|connection manager was called after/i.test(
    cause.message,
  );

function fromComputeError(error: ComputeError): Refusal {
  switch (error.failure) {
    case 'refused':
      return invalid(error.issues.length > 0 ? error.issues : [{ path: '', message: error.message }]);
    case 'timeout':
      return invalid([{ path: '', message: error.message }]);
    case 'closed':
    case 'cancelled':
      return unavailable('The server is stopping. Try again shortly.');
    case 'crashed':
      return internal();
  }
}

function fromBodyError({ status, type }: z.infer<typeof bodyErrorSchema>): Refusal {
  if (type === 'entity.too.large') {
    return tooLarge(`The body is larger than ${LIMITS.bodyBytes / 1e6} MB. Send less at once.`);
  }
  if (type === 'entity.parse.failed') {
    return invalid([{ path: '', message: 'the body is not valid JSON' }]);
  }
  return status < 500 ? invalid([{ path: '', message: `the body cannot be read (${type})` }]) : internal();
}
