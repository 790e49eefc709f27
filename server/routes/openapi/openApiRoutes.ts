import { anyone } from '../../policies/policy.ts';
import { describeApi } from '../../routing/openApi.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { version } from '../../version.ts';

/** @param routes all routes of the API; the description's own address is added */
export function openApiRoutes(routes: Route[]): Route[] {
  // Described at the first question and kept: the routes do not change while the server runs.
  let document: ReturnType<typeof describeApi> | null = null;
  const readDescription = streamRoute({
    method: 'get',
    path: '/openapi.json',
    summary: 'This description of the API, OpenAPI 3.1.',
    policy: anyone,
    answer: { contentType: 'application/json' },
    handler({ response }) {
      document ??= describeApi([...routes, readDescription], version);
      response.json(document);
    },
  });
  return [readDescription];
}
