import type { Route } from '../routing/route.ts';

/** Every route of the API: mounted by app.ts, described in OpenAPI, held against their policies in a test. */
export const allRoutes: Route[] = [];
