import {
  angleFeaturesRequestSchema,
  angleFeaturesSchema,
  liveCurveRequestSchema,
} from '../../../shared/live.ts';
import { signedIn } from '../../policies/policy.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { findAngleFeatures, liveCurve } from '../../services/live.ts';

const createLiveCurve = streamRoute({
  method: 'post',
  path: '/live-curve',
  summary:
    'One curve of up to 400 points at once, as the binary file of a run; it ends when the asker hangs up.',
  policy: signedIn,
  body: liveCurveRequestSchema,
  answer: { contentType: 'application/octet-stream' },
  async handler({ dependencies, actor, body, response }) {
    const hungUp = new AbortController();
    response.once('close', () => hungUp.abort());
    const file = await liveCurve(dependencies, body, actor.roles.keys(), hungUp.signal);
    response.set({ 'Content-Type': 'application/octet-stream', 'Cache-Control': 'no-store' }).end(file);
  },
});

const createAngleFeatures = route({
  method: 'post',
  path: '/angle-features',
  summary: 'The pseudo-Brewster angle and the angles at which rotation or ellipticity change their sign.',
  policy: signedIn,
  body: angleFeaturesRequestSchema,
  answer: { status: 200, schema: angleFeaturesSchema },
  handler: ({ dependencies, actor, body }) =>
    findAngleFeatures(dependencies, body.document, actor.roles.keys()),
});

export const liveRoutes: Route[] = [createLiveCurve, createAngleFeatures];
