import type { ErrorRequestHandler, RequestHandler } from 'express';
import { notFound } from '../errors.ts';
import { toRefusal } from './toRefusal.ts';

/** For every address below /api that no route has. */
export const refuseUnknownAddress: RequestHandler = () => {
  throw notFound('address');
};

/** The last handler: every failure leaves in the one envelope, and the server's own go to the log. */
export const handleErrors: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const refusal = toRefusal(error);
  if (refusal.status >= 500) request.log.error({ err: error }, refusal.message);
  if (response.headersSent) {
    // A stream that broke off: Express cuts the connection, so that nobody takes what came for the whole.
    next(error);
    return;
  }
  response.status(refusal.status).json(refusal.toEnvelope(response.get('X-Request-Id')));
};
