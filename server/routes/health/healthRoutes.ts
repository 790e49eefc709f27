import { healthSchema } from '../../../shared/health.ts';
import { anyone } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { checkHealth } from '../../services/checkHealth.ts';

// Not `route`: the status depends on the answer.
const readHealth = streamRoute({
  method: 'get',
  path: '/health',
  summary: 'Whether database, queue and worker pool work; status 503 when one does not.',
  policy: anyone,
  answer: { contentType: 'application/json', schema: healthSchema },
  async handler({ dependencies, response }) {
    const health = await checkHealth(dependencies);
    response.status(health.ok ? 200 : 503).json(health);
  },
});

export const healthRoutes: Route[] = [readHealth];
