import { Router } from 'express';
import type { Route, RouteServices } from './route.ts';

/** An Express router with these routes and nothing else. Rejected handlers reach the error handler by themselves. */
export function mountRoutes(routes: Route[], services: RouteServices): Router {
  const router = Router({ caseSensitive: true });
  for (const route of routes) {
    router[route.method](route.path, (request, response) => route.handle(request, response, services));
  }
  return router;
}
