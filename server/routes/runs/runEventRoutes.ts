import { readRun } from '../../policies/run.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { loadRun } from '../../services/runs.ts';
import { sendRunEvents } from '../../services/sendRunEvents.ts';

const readRunEvents = streamRoute({
  method: 'get',
  path: '/runs/:runId/events',
  summary: 'Server-sent events: `progress` with the progress of the run, until it has come to its end.',
  noun: 'run',
  policy: readRun,
  load: ({ dependencies, params }) => loadRun(dependencies.models, params.runId),
  answer: { contentType: 'text/event-stream' },
  handler: ({ dependencies, subject, request, response }) =>
    sendRunEvents(dependencies, subject, request, response),
});

export const runEventRoutes: Route[] = [readRunEvents];
