import { Router } from 'express';
import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { tooManyRequests } from '../errors.ts';

const WINDOW_MS = 15 * 60_000;

/**
 * Slows down guessing: failed sign-ins per person and address (and, ten times wider, per address), resets and
 * sign-ups per address. Counted in this process, anew after a restart.
 *
 * @param limit attempts in a quarter of an hour
 */
export function attemptLimits(limit: number): Router {
  const router = Router();
  router.post('/session', limiter(limit, personAndAddress, true), limiter(10 * limit, address, true));
  router.post('/accounts', limiter(limit, address));
  router.post('/password-resets', limiter(limit, personAndAddress), limiter(3 * limit, address));
  router.post('/password-resets/complete', limiter(limit, address, true));
  return router;
}

function limiter(
  limit: number,
  keyGenerator: (request: Request) => string,
  onlyFailures = false,
): RequestHandler {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit,
    keyGenerator,
    skipSuccessfulRequests: onlyFailures,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // What is trusted of the headers is TRUST_PROXY's business; anybody can send one.
    validate: { xForwardedForHeader: false },
    handler: (_request, _response, next) => {
      next(tooManyRequests('Too many attempts. Wait a quarter of an hour, then try again.'));
    },
  });
}

const address = (request: Request) => ipKeyGenerator(request.ip ?? 'unknown');

function personAndAddress(request: Request): string {
  const body: unknown = request.body;
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : '';
  return `${address(request)} ${String(email).trim().toLowerCase().slice(0, 254)}`;
}
