import type { Request } from 'express';
import { invalid } from '../errors.ts';

const LONGEST_KEY = 200;

/** The text by which a request sent twice is known; null without one. @throws Refusal 422 when it is too long */
export function readIdempotencyKey(request: Request): string | null {
  const key = request.get('idempotency-key') ?? null;
  if (key !== null && key.length > LONGEST_KEY) {
    throw invalid([{ path: 'Idempotency-Key', message: `must have at most ${LONGEST_KEY} characters` }]);
  }
  return key;
}
