import { createSecretKey } from 'node:crypto';
import type { KeyObject } from 'node:crypto';
import type { Request, Response } from 'express';
import passport from 'passport';
import { Strategy as JwtStrategy } from 'passport-jwt';
import type { Config } from '../config.ts';
import { unauthenticated } from '../errors.ts';
import type { Models } from '../models/models.ts';
import type { Actor } from '../policies/actor.ts';
import { loadActor } from './loadActor.ts';
import { sessionClaimsSchema, sessionTokenOf } from './sessionCookie.ts';
import { TokenStrategy } from './tokenStrategy.ts';

export type Authenticate = (request: Request, response: Response) => Promise<Actor | null>;

/**
 * Finds out who asks: by API token when there is an Authorization header, else by the session cookie. A cookie that
 * does not hold any more is the same as none; a token that does not hold is a mistake worth telling.
 */
export function createAuthenticator(dependencies: {
  models: Models;
  config: Pick<Config, 'production' | 'sessionSecret'>;
}): Authenticate {
  const instance = new passport.Passport();
  instance.use('token', new TokenStrategy(dependencies));
  instance.use('session', createSessionStrategy(dependencies));
  return async (request, response) => {
    const strategy = request.get('authorization') === undefined ? 'session' : 'token';
    const actor = await new Promise<Actor | null>((resolve, reject) => {
      const done = (error: unknown, found?: unknown) => {
        if (error)
          reject(error instanceof Error ? error : new Error('Authentication failed', { cause: error }));
        // Both strategies pass on what loadActor made, or false.
        else resolve((found as Actor | false | undefined) || null);
      };
      const handle = instance.authenticate(strategy, { session: false }, done) as (
        request: Request,
        response: Response,
        next: (error: unknown) => void,
      ) => void;
      handle(request, response, done);
    });
    if (!actor && strategy === 'token') {
      throw unauthenticated('This API token is unknown or revoked. Send "Authorization: Bearer skw_...".');
    }
    return actor;
  };
}

function createSessionStrategy(dependencies: {
  models: Models;
  config: Pick<Config, 'production' | 'sessionSecret'>;
}): JwtStrategy {
  // A text would be tried as a public key first, at every request. The types of passport-jwt know no key objects.
  const key = createSecretKey(Buffer.from(dependencies.config.sessionSecret)) as KeyObject & Buffer;
  return new JwtStrategy(
    {
      jwtFromRequest: sessionTokenOf,
      secretOrKey: key,
      algorithms: ['HS256'],
    },
    (payload: unknown, done) => {
      const claims = sessionClaimsSchema.safeParse(payload);
      if (!claims.success) {
        done(null, false);
        return;
      }
      loadActor(dependencies, claims.data.sub, 'session', claims.data.generation).then(
        (actor) => done(null, actor ?? false),
        (error: unknown) => done(error, false),
      );
    },
  );
}
