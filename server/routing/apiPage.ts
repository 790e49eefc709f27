import { Router } from 'express';
import swaggerUi from 'swagger-ui-express';

/** A readable page of the API at /docs, everything served from here. It reads /openapi.json. */
export function apiPage(): Router {
  const router = Router();
  const options = { customSiteTitle: 'Skewlight API', swaggerUrl: '/api/v1/openapi.json' };
  router.use('/docs', swaggerUi.serveFiles(undefined, options), swaggerUi.setup(undefined, options));
  return router;
}
