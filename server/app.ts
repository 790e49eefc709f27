import path from 'node:path';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import express from 'express';
import type { Express, RequestHandler } from 'express';
import { LIMITS } from '../shared/limits.ts';
import { attemptLimits } from './auth/attemptLimits.ts';
import { createAuthenticator } from './auth/authenticator.ts';
import type { AppDependencies } from './dependencies.ts';
import { clientFiles } from './http/clientFiles.ts';
import { handleErrors, refuseUnknownAddress } from './http/handleErrors.ts';
import { requestLog } from './http/requestLog.ts';
import { securityHeaders } from './http/security.ts';
import { projectRoot } from './projectRoot.ts';
import { allRoutes } from './routes/allRoutes.ts';
import { apiPage } from './routing/apiPage.ts';
import { mountRoutes } from './routing/mountRoutes.ts';

/** The web application; it listens to nothing by itself. */
export function createApp(dependencies: AppDependencies): Express {
  const { config, logger } = dependencies;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustedProxies);
  app.set('query parser', 'simple');
  app.use(requestLog(logger));
  app.use(securityHeaders(config.publicUrl?.startsWith('https:') ?? false));
  app.use(compression({ filter: isCompressible }));
  app.use('/api', neverStored);
  app.use('/api/v1', apiPage());
  app.use('/api', cookieParser(), express.json({ limit: LIMITS.bodyBytes, strict: false }));
  app.use('/api/v1', attemptLimits(config.attemptLimit));
  app.use(
    '/api/v1',
    mountRoutes(allRoutes, { dependencies, authenticate: createAuthenticator(dependencies) }),
  );
  app.use('/api', refuseUnknownAddress);
  app.use(clientFiles(path.join(projectRoot, 'dist', 'client')));
  app.use(handleErrors);
  return app;
}

/** Compressing server-sent events would hold each back until a block is full; Float64 bytes hardly shrink. */
const isCompressible: compression.CompressionFilter = (request, response) => {
  const type = String(response.getHeader('Content-Type') ?? '');
  const isLeftAlone = type.startsWith('text/event-stream') || type.startsWith('application/octet-stream');
  return !isLeftAlone && compression.filter(request, response);
};

const neverStored: RequestHandler = (_request, response, next) => {
  response.set({ 'Cache-Control': 'no-store', 'X-Robots-Tag': 'noindex' });
  next();
};
