import type { CookieOptions, Request, Response } from 'express';
import jwt from 'jsonwebtoken';
import { z } from 'zod';
import type { Config } from '../config.ts';
import type { User } from '../models/user.ts';

export const SESSION_COOKIE = 'skewlight_session';
const SESSION_DAYS = 14;

/** What the signed token of a session says: whose it is, and which generation of that person's sessions. */
export const sessionClaimsSchema = z.object({ sub: z.uuid(), generation: z.int() });

type Settings = Pick<Config, 'sessionSecret' | 'production'>;

/** Signs the user in on this browser. */
export function setSessionCookie(
  response: Response,
  user: Pick<User, 'id' | 'sessionVersion'>,
  settings: Settings,
): void {
  const token = jwt.sign({ generation: user.sessionVersion }, settings.sessionSecret, {
    algorithm: 'HS256',
    subject: user.id,
    expiresIn: `${SESSION_DAYS}d`,
  });
  response.cookie(SESSION_COOKIE, token, { ...cookieOptions(settings), maxAge: SESSION_DAYS * 86_400_000 });
}

export function clearSessionCookie(response: Response, settings: Settings): void {
  response.clearCookie(SESSION_COOKIE, cookieOptions(settings));
}

/** The token of the request's cookie, unchecked. */
export function sessionTokenOf(request: Request): string | null {
  const cookies = request.cookies as Record<string, unknown> | undefined;
  const token = cookies?.[SESSION_COOKIE];
  return typeof token === 'string' ? token : null;
}

function cookieOptions({ production }: Settings): CookieOptions {
  return { httpOnly: true, sameSite: 'lax', secure: production, path: '/' };
}
