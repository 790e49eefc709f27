import { librarySolveRequestSchema, solveResponseSchema } from '../../../shared/solve.ts';
import { signedIn } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route } from '../../routing/route.ts';
import { solve } from '../../services/solve.ts';

const createSolution = route({
  method: 'post',
  path: '/solve',
  summary: 'Solve up to 20,000 points at once; media by constants or by library id.',
  policy: signedIn,
  body: librarySolveRequestSchema,
  answer: { status: 200, schema: solveResponseSchema },
  handler: ({ dependencies, actor, body }) => solve(dependencies, body, actor.roles.keys()),
});

export const solveRoutes: Route[] = [createSolution];
