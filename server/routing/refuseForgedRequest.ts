import type { Request } from 'express';
import { forbidden } from '../errors.ts';

/**
 * Refuses a change that another site makes a browser send with our cookie (the SameSite attribute is the first
 * fence, this is the second). A request with an Authorization header cannot be forged that way, and a script
 * sends neither Origin nor Sec-Fetch-Site.
 *
 * @param takesFiles whether multipart/form-data, which a form can send too, is taken: browsers name the origin of forms
 * @throws Refusal 403
 */
export function refuseForgedRequest(request: Request, publicUrl: string, takesFiles: boolean): void {
  if (request.method === 'GET' || request.method === 'HEAD' || request.get('authorization')) return;
  const site = request.get('sec-fetch-site');
  if (site !== undefined && site !== 'same-origin' && site !== 'none') throw forged('another site');
  const origin = request.get('origin');
  if (origin !== undefined && !isOurs(origin, request, publicUrl)) throw forged(origin);
  if (takesFiles && request.is('multipart/form-data')) return;
  // A form can send three content types, JSON is none of them.
  if (request.get('content-type') !== undefined && !request.is('application/json') && hasBody(request)) {
    throw forbidden('Send JSON with Content-Type: application/json.');
  }
}

const forged = (from: string) =>
  forbidden(`This request comes from ${from}; changes are only taken from Skewlight itself.`);

function isOurs(origin: string, request: Request, publicUrl: string): boolean {
  if (!URL.canParse(origin)) return false;
  return origin === new URL(publicUrl).origin || new URL(origin).host === request.get('host');
}

function hasBody(request: Request): boolean {
  return request.get('transfer-encoding') !== undefined || Number(request.get('content-length') ?? 0) > 0;
}
