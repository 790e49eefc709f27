import { sensitivityAnswerSchema, sensitivityRequestSchema } from '../../../shared/toleranceDesign.ts';
import { signedIn } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { findSensitivities } from '../../services/findSensitivities.ts';

const readSensitivities = route({
  method: 'post',
  path: '/sensitivity',
  summary: 'Derivatives of every reading by every thickness, index and Q of a film, at each working point.',
  policy: signedIn,
  body: sensitivityRequestSchema,
  answer: { status: 200, schema: sensitivityAnswerSchema },
  handler: ({ dependencies, actor, body }) => findSensitivities(dependencies, body, actor.roles.keys()),
});

export const sensitivityRoutes: Route[] = [readSensitivities];
